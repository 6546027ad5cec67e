import { expect, it } from 'vitest';
import { diffProposal } from './diff-proposal';

const proposal = {
  corners: [
    { x: 0, y: 0 },
    { x: 500, y: 0 },
    { x: 500, y: 1000 },
    { x: 0, y: 1000 },
  ],
  baseline: [
    { x: 0, y: 900 },
    { x: 500, y: 900 },
  ],
  front: [
    { x: 0, y: 100 },
    { x: 500, y: 100 },
  ],
  lanes: [
    { x: 150, spots: [{ x: 150, y: 500 }] },
    {
      x: 350,
      spots: [
        { x: 350, y: 500 },
        { x: 350, y: 300 },
      ],
    },
  ],
};

it('counts marks that were taken as they were proposed', () => {
  expect(diffProposal(proposal, proposal)).toEqual({ accepted: 13, moved: 0, added: 0, removed: 0 });
});

it('tells a moved mark from one removed and another added by how far it went', () => {
  const lanes = (y: number) => [
    proposal.lanes[0]!,
    {
      x: 350,
      spots: [
        { x: 350, y },
        { x: 350, y: 300 },
      ],
    },
  ];
  expect(diffProposal(proposal, { ...proposal, lanes: lanes(520) })).toEqual({
    accepted: 12,
    moved: 1,
    added: 0,
    removed: 0,
  });
  expect(diffProposal(proposal, { ...proposal, lanes: lanes(760) })).toEqual({
    accepted: 12,
    moved: 0,
    added: 1,
    removed: 1,
  });
});

it('counts what was left out and what came in, corners too', () => {
  const marks = {
    ...proposal,
    corners: null,
    lanes: [{ x: 150, spots: [] }, proposal.lanes[1]!, { x: 450, spots: [] }],
  };
  expect(diffProposal(proposal, marks)).toEqual({ accepted: 8, moved: 0, added: 1, removed: 5 });
});

it('does not take half a pixel for a move', () => {
  const lanes = proposal.lanes.map((lane) => ({ ...lane, x: lane.x + 0.3 }));
  expect(diffProposal(proposal, { ...proposal, lanes }).moved).toBe(0);
});
