import { integrate, type Trace } from '@/lib/evidence/gc/integrate';
import { readCsvTrace } from '@/lib/evidence/gc/read-csv';
import { buildEmgTrace } from '../../factories/emg-trace';
import type { BenchRow } from '../bench-row';
import { compare, msText } from '../measure';

const pointCount = 1_200_000;
const durationMin = 60;
const repetitions = 7;

/** An invented chromatogram: a main peak, impurities beside it, drift and noise. */
function buildCsv(): Buffer {
  const { timeMin, signal } = buildEmgTrace({
    pointCount,
    durationMin,
    offset: 5,
    driftPerMin: 0.02,
    noise: 0.01,
    peaks: Array.from({ length: 12 }, (_, index) => ({
      atMin: 4 + 4.4 * index,
      sigmaMin: 0.05,
      tauMin: 0.03,
      areaUnits: index === 5 ? 400 : 0.5 + index,
    })),
  });
  const lines = Array.from(timeMin, (time, index) => `${time.toFixed(6)},${signal[index]!.toFixed(5)}`);
  return Buffer.from(`time_min,signal_mV\n${lines.join('\n')}\n`);
}

function readTrace(bytes: Buffer): Trace {
  const result = readCsvTrace(bytes);
  if (!result.ok) throw new Error(result.problem.message);
  if (result.signal.length !== pointCount) throw new Error(`${result.signal.length} points were read.`);
  return result;
}

/** One plain pass: the area of the raw trace by trapezoids. */
function sumOnce({ timeMin, signal }: Trace): number {
  let area = 0;
  for (let i = 1; i < signal.length; i++)
    area += 0.5 * (signal[i]! + signal[i - 1]!) * (timeMin[i]! - timeMin[i - 1]!);
  return area;
}

export const row: BenchRow = {
  name: 'gc',
  async measure() {
    const bytes = buildCsv();
    const trace = readTrace(bytes);
    const { peaks } = integrate(trace);
    const kept: unknown[] = [];
    const readAndIntegrate = await compare(
      () => void (kept[0] = integrate(readTrace(bytes))),
      () => void (kept[1] = readTrace(bytes)),
      { repetitions },
    );
    const integration = await compare(
      () => void (kept[0] = integrate(trace)),
      () => void (kept[1] = sumOnce(trace)),
      { repetitions },
    );
    const note = `1 200 000 points, ${(bytes.length / 1e6).toFixed(0)} MB of CSV, ${peaks.length} peaks found; medians of ${repetitions}.`;
    return [
      { what: 'GC: reading and integrating ÷ reading alone', result: readAndIntegrate },
      { what: 'GC: integrating ÷ one plain pass over the points', result: integration },
    ].map(({ what, result }) => ({
      what,
      measured: msText(result.measured),
      baseline: msText(result.baseline),
      ratio: result.ratio,
      spread: result.spread,
      note,
    }));
  },
};
