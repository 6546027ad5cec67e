/** What is wrong with a table, in one word, so that a form can point at the right field. */
export type CsvProblemCode =
  | 'empty'
  | 'no numbers'
  | 'one column'
  | 'no such column'
  | 'not a number'
  | 'truncated'
  | 'unsorted times'
  | 'repeated time'
  | 'no time axis'
  | 'too few points'
  | 'not text';

/** A table that cannot be read as a trace. `line` counts from 1 in the file; the message says what to do next. */
export interface CsvProblem {
  code: CsvProblemCode;
  message: string;
  line: number | null;
}
