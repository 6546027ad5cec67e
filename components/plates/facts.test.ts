import { expect, it } from 'vitest';
import { plateBody, type PlatePhotoView } from '@/lib/evidence/tlc/schema';
import { marksOf, noFacts, readSize, requestOf, whatIsMissing } from './facts';
import { type Marks, noMarks } from './marks';

const marks: Marks = {
  corners: [
    { x: 10, y: 20 },
    { x: 590, y: 25 },
    { x: 595, y: 880 },
    { x: 5, y: 870 },
  ],
  baseline: [
    { x: 0, y: 800 },
    { x: 600, y: 800 },
  ],
  front: [
    { x: 0, y: 80 },
    { x: 600, y: 80 },
  ],
  lanes: [
    {
      label: 'F3',
      x: 200,
      subject: { kind: 'fraction', code: 'D-2026-0042-F3' },
      dilutionPercent: '',
      spots: [{ x: 200, y: 400, shape: 'streak' }],
    },
    { label: 'ref', x: 400, subject: { kind: 'reference' }, dilutionPercent: '1,5', spots: [] },
  ],
};
const facts = { ...noFacts, stationaryPhase: 'silica gel', eluent: 'toluene', widthMm: '50,5' };
const evidenceId = '01a23157-5f76-758c-bb30-7588a2f6e5ed';

it('builds a body that the API takes, with a decimal comma read as one', () => {
  const body = plateBody.parse(requestOf(evidenceId, facts, marks));
  expect(body).toMatchObject({ units: 'px', widthMm: 50.5, heightMm: null, visualiser: 'uv-254' });
  expect(body.lanes[0]).toMatchObject({ x: 200, subject: { kind: 'fraction', code: 'D-2026-0042-F3' } });
  expect(body.lanes[1]).toMatchObject({ subject: { kind: 'reference' }, dilutionPercent: 1.5 });
  expect(body.corners).toEqual(marks.corners);
  expect(plateBody.parse(requestOf(evidenceId, facts, { ...marks, corners: [] })).corners).toBeNull();
});

it('sends what was proposed beside the marks, but no sign of it in them', () => {
  const proposal = { ...marks, lanes: [] };
  const started: Marks = { ...marks, front: marks.front.map((point) => ({ ...point, proposed: 0.5 })) };
  const body = plateBody.parse(requestOf(evidenceId, facts, started, proposal));
  expect(body.proposal).toEqual(proposal);
  expect(body.front).toEqual(marks.front);
});

it('gives back the marks that were saved', () => {
  const photo = {
    units: 'px',
    corners: marks.corners,
    baseline: marks.baseline,
    front: marks.front,
    lanes: marks.lanes.map((lane, l) => ({
      ...lane,
      id: evidenceId,
      dilutionPercent: l === 1 ? 1.5 : null,
      spots: lane.spots.map(({ x, y }) => ({ x, y, rf: 0.5, rfUncertainty: 0.01, flags: ['streak'] })),
    })),
  } as unknown as PlatePhotoView;
  expect(marksOf(photo, 600)).toMatchObject({
    corners: marks.corners,
    baseline: marks.baseline,
    front: marks.front,
  });
  expect(marksOf(photo, 600).lanes.map((lane) => lane.dilutionPercent)).toEqual(['', '1.5']);
  expect(marksOf(photo, 600).lanes[0]!.spots).toEqual(marks.lanes[0]!.spots);
});

it('takes no places from marks in millimetres, but keeps the lanes', () => {
  const photo = {
    units: 'mm',
    corners: null,
    baseline: [{ x: 0, y: 10 }],
    front: [{ x: 0, y: 60 }],
    lanes: [
      {
        label: 'a',
        x: 20,
        subject: { kind: 'crude' },
        dilutionPercent: null,
        spots: [{ x: 20, y: 32, flags: [] }],
      },
    ],
  } as unknown as PlatePhotoView;
  const found = marksOf(photo, 600);
  expect(found.baseline).toEqual([]);
  expect(found.lanes).toMatchObject([{ label: 'a', x: 300, spots: [] }]);
});

it('says what is missing in the order in which it is done', () => {
  expect(whatIsMissing(facts, noMarks)).toContain('baseline');
  expect(whatIsMissing(facts, { ...marks, front: [] })).toContain('solvent front');
  expect(whatIsMissing(facts, { ...marks, lanes: [] })).toContain('lane');
  const nameless: Marks = { ...marks, lanes: [{ ...marks.lanes[0]!, subject: { kind: 'fraction' } }] };
  expect(whatIsMissing(facts, nameless)).toContain('which fraction');
  const unsaid: Marks = { ...marks, lanes: [{ ...marks.lanes[1]!, subject: { kind: null } }] };
  expect(whatIsMissing(facts, unsaid)).toBe('Say what lane ref holds.');
  expect(whatIsMissing({ ...facts, eluent: ' ' }, marks)).toContain('eluent');
  expect(whatIsMissing({ ...facts, heightMm: 'tall' }, marks)).toContain('height');
  expect(whatIsMissing(facts, { ...marks, corners: marks.corners.slice(1) })).toContain('four corners');
  const strong: Marks = { ...marks, lanes: [{ ...marks.lanes[1]!, dilutionPercent: '101' }] };
  expect(whatIsMissing(facts, strong)).toContain('dilution');
  expect(whatIsMissing(facts, marks)).toBeNull();
});

it('reads a size, an empty one, and what is none', () => {
  expect(readSize(' 100 ')).toBe(100);
  expect(readSize('')).toBeNull();
  expect(readSize('x')).toBeNaN();
});
