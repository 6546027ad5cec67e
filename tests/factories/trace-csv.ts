/** A table of time and signal as instruments write it. Seventeen digits, so that nothing is lost on the way. */
export function writeTraceCsv(
  trace: { timeMin: Float64Array; signal: Float64Array },
  options: { delimiter?: string; decimal?: '.' | ','; timeUnit?: 'min' | 's'; heading?: boolean } = {},
): Buffer {
  const { delimiter = ',', decimal = '.', timeUnit = 'min', heading = true } = options;
  const cell = (value: number) => String(value).replace('.', decimal);
  const rows = Array.from(trace.timeMin, (t, i) => {
    const time = timeUnit === 's' ? t * 60 : t;
    return `${cell(time)}${delimiter}${cell(trace.signal[i]!)}`;
  });
  if (heading) rows.unshift(`Time (${timeUnit})${delimiter}Signal (pA)`);
  return Buffer.from(rows.join('\n') + '\n');
}
