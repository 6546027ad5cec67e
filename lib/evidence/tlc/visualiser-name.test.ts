import { expect, it } from 'vitest';
import { visualiserId, visualiserName } from './visualiser-name';

it('knows a visualiser by its id, its name and what it is called at the bench', () => {
  for (const text of ['uv-254', 'UV 254 nm', 'UV254', 'uv']) expect(visualiserId(text)).toBe('uv-254');
  expect(visualiserId('KMnO4')).toBe('permanganate');
  expect(visualiserId('Potassium permanganate')).toBe('permanganate');
  expect(visualiserName('permanganate')).toBe('potassium permanganate');
});

it('keeps what it does not know as it was written', () => {
  expect(visualiserId('vanillin, warm')).toBe('vanillin, warm');
  expect(visualiserName('vanillin, warm')).toBe('vanillin, warm');
});
