import { ZodError } from 'zod';
import { invalidField } from '@/lib/errors';
import { integrate, type Trace as TracePoints } from './integrate';
import { type Integration, TraceProblem } from './integration';
import type { IntegrationParametersInput } from './parameters';
import { type CsvDetected, readCsvTrace } from './read-csv';
import type { CsvProblemCode } from './csv-problem';
import type { ReadOptions } from './schema';

/** Formats that are kept as evidence and cannot be read yet. */
const laterFormats: Record<string, string> = {
  'application/x-netcdf': 'ANDI (netCDF)',
  'chemical/x-jcamp-dx': 'JCAMP-DX',
};

/** The field of the body that helps against a problem; the rest lies in the file. */
const fieldOf: Partial<Record<CsvProblemCode, string>> = {
  'one column': 'read.samplingHz',
  'no time axis': 'read.samplingHz',
  'no such column': 'read.timeColumn',
  'no numbers': 'read.delimiter',
};

export type ParsedTrace = { points: TracePoints; detected: CsvDetected };

/**
 * Reads the points of a trace from the bytes of its file. Heavy for long traces: never inside a transaction.
 * 422 that names the field and the line for a table that cannot be read, and for formats whose reader comes later.
 */
export function parseTrace(bytes: Uint8Array, mediaType: string, read: ReadOptions): ParsedTrace {
  const later = laterFormats[mediaType];
  if (later) {
    throw invalidField(
      'evidenceId',
      `${later} files are kept, but their reader comes later. Export the trace as CSV (time and signal) and send that as well.`,
    );
  }
  const result = readCsvTrace(bytes, read);
  if (!result.ok) {
    const { code, message, line } = result.problem;
    const where = line === null || /\bline\b/i.test(message) ? '' : `Line ${line}: `;
    const field =
      code === 'no such column' && read.timeColumn === undefined ? 'read.signalColumn' : fieldOf[code];
    throw invalidField(field ?? 'evidenceId', `${where}${message}`);
  }
  return { points: { timeMin: result.timeMin, signal: result.signal }, detected: result.detected };
}

/** Integrates parsed points; 422 for points that cannot be integrated or parameters outside their limits. */
export function integratePoints(points: TracePoints, parameters: IntegrationParametersInput): Integration {
  try {
    return integrate(points, parameters);
  } catch (error) {
    if (error instanceof TraceProblem) throw invalidField('evidenceId', error.message);
    if (error instanceof ZodError) {
      const [first] = error.issues;
      throw invalidField(`parameters.${first?.path.join('.')}`, first?.message ?? 'Check the parameters.');
    }
    throw error;
  }
}
