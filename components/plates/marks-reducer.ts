import {
  type Lane,
  type MarkRef,
  type Marks,
  mostBaselinePoints,
  mostFrontPoints,
  nearestLane,
  placeOf,
  type Point,
  type Spot,
} from './marks';

export type MarksState = {
  marks: Marks;
  selected: MarkRef | null;
  past: Marks[];
  future: Marks[];
  /** What the last step moved: steps of one move are undone together. */
  moving: string | null;
  /** Counted on by each change, so that a page can tell touched marks from loaded ones. */
  changes: number;
};

export type MarksAction =
  | { type: 'load'; marks: Marks; changed?: boolean }
  | { type: 'select'; ref: MarkRef | null }
  | { type: 'addPoint'; line: 'baseline' | 'front'; at: Point }
  | { type: 'addLane'; x: number }
  | { type: 'addSpot'; at: Point; lane?: number }
  | { type: 'move'; ref: MarkRef; to: Point }
  | { type: 'endMove' }
  | { type: 'remove'; ref: MarkRef }
  | { type: 'changeLane'; lane: number; change: Partial<Pick<Lane, 'label' | 'subject'>> }
  | { type: 'changeSpot'; lane: number; spot: number; shape: Spot['shape'] }
  | { type: 'undo' }
  | { type: 'redo' };

export type Extent = { width: number; height: number };
const mostUndo = 200;

export function startMarks(marks: Marks): MarksState {
  return { marks, selected: null, past: [], future: [], moving: null, changes: 0 };
}

function within(point: Point, { width, height }: Extent): Point {
  return { x: Math.min(width, Math.max(0, point.x)), y: Math.min(height, Math.max(0, point.y)) };
}

function replace<T>(list: readonly T[], index: number, value: T): T[] {
  return list.map((one, at) => (at === index ? value : one));
}

function moved(marks: Marks, ref: MarkRef, to: Point): Marks {
  if (ref.kind === 'baseline' || ref.kind === 'front')
    return { ...marks, [ref.kind]: replace(marks[ref.kind], ref.index, to) };
  const lane = marks.lanes[ref.lane]!;
  const next =
    ref.kind === 'lane'
      ? { ...lane, x: to.x }
      : { ...lane, spots: replace(lane.spots, ref.spot, { ...lane.spots[ref.spot]!, ...to }) };
  return { ...marks, lanes: replace(marks.lanes, ref.lane, next) };
}

function without(marks: Marks, ref: MarkRef): Marks {
  const drop = <T>(list: readonly T[], index: number) => list.filter((_one, at) => at !== index);
  if (ref.kind === 'baseline' || ref.kind === 'front')
    return { ...marks, [ref.kind]: drop(marks[ref.kind], ref.index) };
  if (ref.kind === 'lane') return { ...marks, lanes: drop(marks.lanes, ref.lane) };
  const lane = marks.lanes[ref.lane]!;
  return { ...marks, lanes: replace(marks.lanes, ref.lane, { ...lane, spots: drop(lane.spots, ref.spot) }) };
}

/** A further step of the same move adds no state to go back to. */
function change(
  state: MarksState,
  marks: Marks,
  selected: MarkRef | null,
  moving: string | null = null,
): MarksState {
  const goesOn = moving !== null && moving === state.moving;
  return {
    marks,
    selected,
    past: goesOn ? state.past : [...state.past, state.marks].slice(-mostUndo),
    future: [],
    moving,
    changes: state.changes + 1,
  };
}

function newLane(marks: Marks, x: number): Lane {
  return { label: `${marks.lanes.length + 1}`, x, subject: { kind: 'crude' }, spots: [] };
}

function addSpot(state: MarksState, at: Point, wanted: number | undefined): MarksState {
  const { marks } = state;
  const lanes = marks.lanes.length === 0 ? [newLane(marks, at.x)] : marks.lanes;
  const lane = wanted ?? Math.max(0, nearestLane(marks, at.x));
  const spots: Spot[] = [...lanes[lane]!.spots, { ...at, shape: 'spot' }];
  return change(
    state,
    { ...marks, lanes: replace(lanes, lane, { ...lanes[lane]!, spots }) },
    {
      kind: 'spot',
      lane,
      spot: spots.length - 1,
    },
  );
}

/** Everything that can be done to the marks of a photo, with undo and redo. Pure; marks never leave the photo. */
export function reduceMarks(state: MarksState, action: MarksAction, extent: Extent): MarksState {
  const { marks } = state;
  switch (action.type) {
    case 'load':
      return { ...startMarks(action.marks), changes: action.changed ? 1 : 0 };
    case 'select':
      return { ...state, selected: action.ref, moving: null };
    case 'addPoint': {
      const line = marks[action.line];
      if (line.length >= (action.line === 'baseline' ? mostBaselinePoints : mostFrontPoints)) return state;
      const next = { ...marks, [action.line]: [...line, within(action.at, extent)] };
      return change(state, next, { kind: action.line, index: line.length });
    }
    case 'addLane': {
      const { x } = within({ x: action.x, y: 0 }, extent);
      const lanes = [...marks.lanes, newLane(marks, x)];
      return change(state, { ...marks, lanes }, { kind: 'lane', lane: lanes.length - 1 });
    }
    case 'addSpot':
      return addSpot(state, within(action.at, extent), action.lane);
    case 'move': {
      if (!placeOf(marks, action.ref)) return state;
      const to = within(action.to, extent);
      return change(state, moved(marks, action.ref, to), action.ref, JSON.stringify(action.ref));
    }
    case 'endMove':
      return { ...state, moving: null };
    case 'remove':
      return placeOf(marks, action.ref) ? change(state, without(marks, action.ref), null) : state;
    case 'changeLane': {
      const lane = marks.lanes[action.lane];
      if (!lane) return state;
      const typing = action.change.label !== undefined ? `label ${action.lane}` : null;
      const lanes = replace(marks.lanes, action.lane, { ...lane, ...action.change });
      return change(state, { ...marks, lanes }, state.selected, typing);
    }
    case 'changeSpot': {
      const lane = marks.lanes[action.lane];
      const spot = lane?.spots[action.spot];
      if (!lane || !spot) return state;
      const spots = replace(lane.spots, action.spot, { ...spot, shape: action.shape });
      return change(
        state,
        { ...marks, lanes: replace(marks.lanes, action.lane, { ...lane, spots }) },
        state.selected,
      );
    }
    case 'undo': {
      const before = state.past.at(-1);
      if (!before) return state;
      const past = state.past.slice(0, -1);
      return {
        ...state,
        marks: before,
        past,
        future: [marks, ...state.future],
        selected: null,
        moving: null,
        changes: state.changes + 1,
      };
    }
    case 'redo': {
      const [after, ...future] = state.future;
      if (!after) return state;
      return {
        ...state,
        marks: after,
        past: [...state.past, marks],
        future,
        selected: null,
        moving: null,
        changes: state.changes + 1,
      };
    }
  }
}
