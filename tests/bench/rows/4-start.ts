import { startApp, startBareServer } from '../app-process';
import type { BenchRow } from '../bench-row';
import { compare, msText } from '../measure';

async function readyAfterMs(start: typeof startApp): Promise<number> {
  const program = await start();
  await program.stop();
  return program.readyAfterMs;
}

export const row: BenchRow = {
  name: 'start',
  async measure() {
    const result = await compare(
      () => readyAfterMs(startApp),
      () => readyAfterMs(startBareServer),
      { repetitions: 5 },
    );
    return [
      {
        what: 'start to ready from a finished build ÷ bare Node server',
        measured: msText(result.measured),
        baseline: msText(result.baseline),
        ratio: result.ratio,
        spread: result.spread,
        goal: 'under 5 000 ms on 2 cores',
        note: `To the first 200 of /api/health, services running; ${result.repetitions} starts after one to warm up.`,
      },
    ];
  },
};
