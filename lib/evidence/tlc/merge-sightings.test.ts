import { expect, it } from 'vitest';
import { mergeSightings, type Sighting } from './merge-sightings';

const sighting = (photoId: string, index: number, rf: number, rfUncertainty = 0.012): Sighting => ({
  photoId,
  evidenceId: photoId,
  visualiser: photoId,
  index,
  rf,
  rfUncertainty,
});

it('takes the same spot in two photos for one, with the more certain Rf', () => {
  const [one, ...more] = mergeSightings([sighting('uv', 0, 0.44), sighting('stain', 0, 0.46, 0.01)]);
  expect(more).toEqual([]);
  expect(one).toMatchObject({ rf: 0.46, rfUncertainty: 0.01 });
  expect(one!.seenIn.map((seen) => seen.photoId)).toEqual(['uv', 'stain']);
});

it('keeps spots apart that only one visualiser shows', () => {
  const spots = mergeSightings([sighting('uv', 0, 0.7), sighting('stain', 0, 0.44)]);
  expect(spots.map((spot) => spot.rf)).toEqual([0.44, 0.7]);
});

it('never makes one of two spots of the same photo, and gives the third to the nearer', () => {
  const spots = mergeSightings([
    sighting('uv', 0, 0.44),
    sighting('uv', 1, 0.46),
    sighting('stain', 0, 0.458),
  ]);
  expect(spots.map((spot) => spot.seenIn.map((seen) => `${seen.photoId} ${seen.index}`))).toEqual([
    ['uv 0'],
    ['uv 1', 'stain 0'],
  ]);
});
