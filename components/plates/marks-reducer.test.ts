import { expect, it } from 'vitest';
import { noMarks } from './marks';
import { type MarksAction, type MarksState, reduceMarks, startMarks } from './marks-reducer';

const extent = { width: 600, height: 900 };
const after = (actions: MarksAction[], from: MarksState = startMarks(noMarks)) =>
  actions.reduce((state, action) => reduceMarks(state, action, extent), from);

const lines: MarksAction[] = [
  { type: 'addPoint', line: 'baseline', at: { x: 50, y: 800 } },
  { type: 'addPoint', line: 'baseline', at: { x: 550, y: 810 } },
  { type: 'addPoint', line: 'front', at: { x: 50, y: 80 } },
];

it('takes two points for the baseline and up to five for the front, and selects the new one', () => {
  const state = after([...lines, { type: 'addPoint', line: 'baseline', at: { x: 300, y: 805 } }]);
  expect(state.marks.baseline).toEqual([
    { x: 50, y: 800 },
    { x: 550, y: 810 },
  ]);
  expect(state.selected).toEqual({ kind: 'front', index: 0 });
  const front = after(
    Array.from({ length: 7 }, (_, i): MarksAction => ({
      type: 'addPoint',
      line: 'front',
      at: { x: i * 50, y: 80 },
    })),
  );
  expect(front.marks.front).toHaveLength(5);
});

it('gives a spot to the nearest lane, and makes a lane where there is none', () => {
  const alone = after([{ type: 'addSpot', at: { x: 120, y: 400 } }]);
  expect(alone.marks.lanes).toMatchObject([
    { label: '1', x: 120, spots: [{ x: 120, y: 400, shape: 'spot' }] },
  ]);
  const state = after([
    { type: 'addLane', x: 100 },
    { type: 'addLane', x: 300 },
    { type: 'addSpot', at: { x: 260, y: 400 } },
    { type: 'addSpot', at: { x: 300, y: 500 }, lane: 0 },
  ]);
  expect(state.marks.lanes.map((lane) => lane.spots.length)).toEqual([1, 1]);
  expect(state.selected).toEqual({ kind: 'spot', lane: 0, spot: 0 });
});

it('keeps every mark on the photo', () => {
  const state = after([
    ...lines,
    { type: 'move', ref: { kind: 'baseline', index: 0 }, to: { x: -40, y: 2000 } },
  ]);
  expect(state.marks.baseline[0]).toEqual({ x: 0, y: 900 });
});

it('undoes a whole drag at once, and redoes it', () => {
  const ref = { kind: 'front', index: 0 } as const;
  const drag: MarksAction[] = [90, 100, 110].map((y) => ({ type: 'move', ref, to: { x: 50, y } }));
  const state = after([...lines, ...drag, { type: 'endMove' }]);
  expect(state.marks.front[0]!.y).toBe(110);
  const back = after([{ type: 'undo' }], state);
  expect(back.marks.front[0]!.y).toBe(80);
  expect(after([{ type: 'redo' }], back).marks.front[0]!.y).toBe(110);
  const twoDrags = after([{ type: 'move', ref, to: { x: 50, y: 120 } }, { type: 'undo' }], state);
  expect(twoDrags.marks.front[0]!.y).toBe(110);
});

it('forgets what could be redone once something new is done', () => {
  const state = after([...lines, { type: 'undo' }, { type: 'addLane', x: 10 }]);
  expect(state.future).toEqual([]);
  expect(after([{ type: 'redo' }], state)).toBe(state);
});

it('removes a mark, and a lane with its spots', () => {
  const state = after([
    { type: 'addSpot', at: { x: 100, y: 400 } },
    { type: 'addSpot', at: { x: 100, y: 500 } },
    { type: 'remove', ref: { kind: 'spot', lane: 0, spot: 0 } },
  ]);
  expect(state.marks.lanes[0]!.spots).toMatchObject([{ y: 500 }]);
  expect(state.selected).toBeNull();
  expect(after([{ type: 'remove', ref: { kind: 'lane', lane: 0 } }], state).marks.lanes).toEqual([]);
});

it('does nothing to marks that are not there', () => {
  const state = startMarks(noMarks);
  const ref = { kind: 'spot', lane: 3, spot: 1 } as const;
  expect(after([{ type: 'move', ref, to: { x: 1, y: 1 } }], state)).toBe(state);
  expect(after([{ type: 'remove', ref }], state)).toBe(state);
  expect(after([{ type: 'undo' }], state)).toBe(state);
});

it('tells touched marks from loaded ones', () => {
  const loaded = after([{ type: 'load', marks: { ...noMarks, front: [{ x: 1, y: 1 }] } }]);
  expect(loaded.changes).toBe(0);
  expect(after([{ type: 'select', ref: { kind: 'front', index: 0 } }], loaded).changes).toBe(0);
  expect(after([{ type: 'addLane', x: 5 }], loaded).changes).toBe(1);
});

it('undoes a label that was typed as one step', () => {
  const typed = [...'pure'].map((_, i): MarksAction => ({
    type: 'changeLane',
    lane: 0,
    change: { label: 'pure'.slice(0, i + 1) },
  }));
  const state = after([{ type: 'addLane', x: 5 }, ...typed]);
  expect(state.marks.lanes[0]!.label).toBe('pure');
  expect(after([{ type: 'undo' }], state).marks.lanes[0]!.label).toBe('1');
});

it('takes four corners in any order and names them clockwise from the top left', () => {
  const pressed = [
    { x: 560, y: 880 },
    { x: 40, y: 30 },
    { x: 30, y: 870 },
    { x: 570, y: 25 },
  ];
  const state = after(pressed.map((at): MarksAction => ({ type: 'addPoint', line: 'corner', at })));
  expect(state.marks.corners).toEqual([pressed[1], pressed[3], pressed[0], pressed[2]]);
  expect(state.selected).toEqual({ kind: 'corner', index: 1 });
  expect(after([{ type: 'addPoint', line: 'corner', at: { x: 1, y: 1 } }], state)).toBe(state);
});

it('makes a proposal no change of the person’s own, and can take it back', () => {
  const proposal = {
    corners: [],
    baseline: [
      { x: 10, y: 800 },
      { x: 590, y: 800 },
    ],
    front: [],
    lanes: [],
    confidence: 0.7,
  };
  const state = after([{ type: 'propose', proposal }]);
  expect(state.changes).toBe(0);
  expect(state.marks.baseline[0]).toEqual({ x: 10, y: 800, proposed: 0.7 });
  const one = after([{ type: 'accept', ref: { kind: 'baseline', index: 0 } }], state);
  expect(one.changes).toBe(1);
  expect(one.marks.baseline.map((point) => point.proposed)).toEqual([undefined, 0.7]);
  expect(after([{ type: 'refuseAll' }], one).marks.baseline).toEqual([{ x: 10, y: 800 }]);
  expect(after([{ type: 'undo' }, { type: 'undo' }], one).marks.baseline).toEqual([]);
});
