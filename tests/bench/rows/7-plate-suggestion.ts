import { monitorEventLoopDelay } from 'node:perf_hooks';
import sharp from 'sharp';
import { stopSuggestions, suggestPlateFromFile } from '@/lib/evidence/tlc/suggestion/suggest-plate-from-file';
import { plateCase, renderCase } from '../../factories/plate-renderer/plate-set';
import type { BenchRow } from '../bench-row';
import { compare, median, msText } from '../measure';

const repetitions = 7;
const warmUps = 6;

/** Photos of 12 megapixels: one with the grain that a phone leaves, one smooth, whose bare decode is quick. */
async function renderPhotos(): Promise<{ name: string; jpeg: Buffer }[]> {
  const grainy = plateCase(3, 4032);
  grainy.exposure.noise = 4;
  const smooth = plateCase(3, 4032);
  smooth.exposure.noise = 0.5;
  return [
    { name: 'grainy photo', jpeg: (await renderCase(grainy)).jpeg },
    { name: 'smooth photo', jpeg: (await renderCase(smooth)).jpeg },
  ];
}

export const row: BenchRow = {
  name: 'plate-suggestion',
  async measure() {
    const figures = [];
    try {
      for (const { name, jpeg } of await renderPhotos()) {
        const delaysMs: number[] = [];
        const result = await compare(
          async () => {
            const delay = monitorEventLoopDelay({ resolution: 1 });
            const started = performance.now();
            delay.enable();
            await suggestPlateFromFile(jpeg);
            const took = performance.now() - started;
            delay.disable();
            delaysMs.push(delay.percentile(99) / 1e6);
            return took;
          },
          async () => void (await sharp(jpeg).raw().toBuffer()),
          { repetitions, warmUps },
        );
        figures.push({
          what: `Plate: suggestion on 12 MP, ${name} ÷ bare decode by sharp`,
          measured: msText(result.measured),
          baseline: msText(result.baseline),
          ratio: result.ratio,
          spread: result.spread,
          goal: 'at most 2',
          note: `${(jpeg.length / 1e6).toFixed(1)} MB; event loop delay p99 while it runs ${median(delaysMs.slice(warmUps)).toFixed(1)} ms (goal under 20 ms).`,
        });
      }
    } finally {
      await stopSuggestions();
    }
    return figures;
  },
};
