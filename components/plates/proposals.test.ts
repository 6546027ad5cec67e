import { describe, expect, it } from 'vitest';
import { acceptMark, moveMark, removeMark, withLane } from './edit-marks';
import { type Marks, noMarks } from './marks';
import {
  acceptEvery,
  confidenceWords,
  type Proposal,
  propose,
  proposedRefs,
  withoutProposed,
} from './proposals';

const extent = { width: 1000, height: 1500 };
const proposal: Proposal = {
  corners: [
    { x: 50, y: 60 },
    { x: 950, y: 60 },
    { x: 950, y: 1450 },
    { x: 50, y: 1450 },
  ],
  baseline: [
    { x: 60, y: 1300 },
    { x: 940, y: 1300 },
  ],
  front: [
    { x: 60, y: 150 },
    { x: 500, y: 140 },
    { x: 940, y: 150 },
  ],
  lanes: [
    {
      x: 300,
      spots: [
        { x: 300, y: 700, rf: 0.52, confidence: 0.9 },
        { x: 301, y: 1000, rf: 0.26, confidence: 0.4, shape: 'streak' },
      ],
    },
    { x: 700, spots: [] },
  ],
  confidence: 0.7,
};
const proposed = propose(noMarks, proposal, extent);

describe('a proposal', () => {
  it('is marked as such in every mark, each spot with its own confidence', () => {
    expect(proposedRefs(proposed)).toHaveLength(4 + 2 + 3 + 2 + 2);
    expect(proposed.lanes[0]!.spots).toEqual([
      { x: 300, y: 700, shape: 'spot', proposed: 0.9 },
      { x: 301, y: 1000, shape: 'streak', proposed: 0.4 },
    ]);
  });

  it('is nothing that may be saved until somebody has looked at it', () => {
    expect(withoutProposed(proposed)).toEqual(noMarks);
    expect(proposedRefs(acceptEvery(proposed))).toEqual([]);
    expect(withoutProposed(acceptEvery(proposed))).toEqual(acceptEvery(proposed));
  });

  it('becomes the person’s own mark by mark: accepted, moved, or gone', () => {
    const spot = { kind: 'spot', lane: 0, spot: 0 } as const;
    const accepted = acceptMark(proposed, spot);
    // A spot stands in its lane, which is accepted with it; the other spot is not.
    expect(withoutProposed(accepted).lanes).toMatchObject([{ x: 300, spots: [{ x: 300, y: 700 }] }]);
    const moved = moveMark(proposed, { kind: 'front', index: 1 }, { x: 500, y: 135 });
    expect(withoutProposed(moved).front).toEqual([{ x: 500, y: 135 }]);
    const less = removeMark(proposed, spot);
    expect(withoutProposed(less).lanes).toEqual([]);
    expect(less.lanes[0]!.spots).toHaveLength(1);
    expect(withoutProposed(withLane(proposed, 1, { label: 'F2' })).lanes).toMatchObject([{ label: 'F2' }]);
  });

  it('leaves alone what a person has marked, and fills what is missing', () => {
    const own: Marks = {
      ...noMarks,
      baseline: [
        { x: 0, y: 1310 },
        { x: 999, y: 1310 },
      ],
      lanes: [
        {
          label: 'F3',
          x: 310,
          subject: { kind: 'fraction', code: 'D-2026-0042-F3' },
          dilutionPercent: '',
          spots: [{ x: 305, y: 705, shape: 'spot' }],
        },
      ],
    };
    const both = propose(own, proposal, extent);
    expect(both.baseline).toEqual(own.baseline);
    expect(both.lanes).toMatchObject([
      {
        label: 'F3',
        x: 310,
        spots: [
          { x: 305, y: 705 },
          { x: 301, y: 1000, proposed: 0.4 },
        ],
      },
      { label: '2', x: 700, proposed: 0.7 },
    ]);
    expect(withoutProposed(both)).toEqual(own);
  });

  it('gives way to the next one instead of piling up', () => {
    expect(propose(proposed, proposal, extent)).toEqual(proposed);
  });
});

it('says how sure it is in a word and in per cent', () => {
  expect([0.93, 0.7, 0.31].map(confidenceWords)).toEqual([
    'sure, 93 %',
    'fairly sure, 70 %',
    'not sure, 31 %',
  ]);
});
