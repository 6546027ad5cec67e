import {
  acceptMark,
  addSpotTo,
  type Extent,
  moveMark,
  newLane,
  removeMark,
  replaceAt,
  withLane,
  within,
} from './edit-marks';
import {
  type Lane,
  listOf,
  markAt,
  type MarkRef,
  type Marks,
  mostPoints,
  nearestLane,
  type Point,
  type PointKind,
  type Spot,
} from './marks';
import { orderCorners } from './order-corners';
import { acceptEvery, type Proposal, propose, withoutProposed } from './proposals';

export type { Extent };
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
  | { type: 'addPoint'; line: PointKind; at: Point }
  | { type: 'addLane'; x: number }
  | { type: 'addSpot'; at: Point; lane?: number }
  | { type: 'move'; ref: MarkRef; to: Point }
  | { type: 'endMove' }
  | { type: 'remove'; ref: MarkRef }
  | { type: 'changeLane'; lane: number; change: Partial<Pick<Lane, 'label' | 'subject' | 'dilutionPercent'>> }
  | { type: 'changeSpot'; lane: number; spot: number; shape: Spot['shape'] }
  | { type: 'takeOver'; marks: Partial<Marks> }
  | { type: 'propose'; proposal: Proposal }
  | { type: 'accept'; ref: MarkRef }
  | { type: 'acceptAll' }
  | { type: 'refuseAll' }
  | { type: 'undo' }
  | { type: 'redo' };

const mostUndo = 200;

export function startMarks(marks: Marks): MarksState {
  return { marks, selected: null, past: [], future: [], moving: null, changes: 0 };
}

/** A further step of the same move adds no state to go back to. */
function change(
  state: MarksState,
  marks: Marks,
  selected: MarkRef | null = state.selected,
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

function addPoint(state: MarksState, kind: PointKind, at: Point): MarksState {
  const key = listOf[kind];
  const line = state.marks[key];
  if (line.length >= mostPoints[kind]) return state;
  const added = { ...state.marks, [key]: [...line, at] };
  const corners = orderCorners(added);
  const index = kind === 'corner' ? corners.indexOf(at) : line.length;
  return change(state, { ...added, corners }, { kind, index });
}

/** Another state of the marks, of which the selected mark may not be part. */
function jump(state: MarksState, marks: Marks, past: Marks[], future: Marks[]): MarksState {
  return { marks, past, future, selected: null, moving: null, changes: state.changes + 1 };
}

/** Everything that can be done to the marks of a photo, with undo and redo. Pure; marks never leave the photo. */
export function reduceMarks(state: MarksState, action: MarksAction, extent: Extent): MarksState {
  const { marks } = state;
  switch (action.type) {
    case 'load':
      return { ...startMarks(action.marks), changes: action.changed ? 1 : 0 };
    case 'select':
      return { ...state, selected: action.ref, moving: null };
    case 'addPoint':
      return addPoint(state, action.line, within(action.at, extent));
    case 'addLane': {
      const { x } = within({ x: action.x, y: 0 }, extent);
      const lanes = [...marks.lanes, newLane(marks, x)];
      return change(state, { ...marks, lanes }, { kind: 'lane', lane: lanes.length - 1 });
    }
    case 'addSpot': {
      const at = within(action.at, extent);
      const added = addSpotTo(marks, action.lane ?? nearestLane(marks, at.x), at);
      return change(state, added.marks, added.ref);
    }
    case 'move': {
      if (!markAt(marks, action.ref)) return state;
      const to = within(action.to, extent);
      return change(state, moveMark(marks, action.ref, to), action.ref, JSON.stringify(action.ref));
    }
    case 'endMove':
      return { ...state, moving: null };
    case 'remove':
      return markAt(marks, action.ref) ? change(state, removeMark(marks, action.ref), null) : state;
    case 'changeLane': {
      if (!marks.lanes[action.lane]) return state;
      const typed = Object.keys(action.change).find((key) => key !== 'subject');
      const typing = action.change.subject === undefined ? `${typed} ${action.lane}` : null;
      return change(state, withLane(marks, action.lane, action.change), state.selected, typing);
    }
    case 'changeSpot': {
      const spots = marks.lanes[action.lane]?.spots;
      const spot = spots?.[action.spot];
      if (!spots || !spot) return state;
      const next = replaceAt(spots, action.spot, { ...spot, shape: action.shape });
      return change(
        state,
        acceptMark(withLane(marks, action.lane, { spots: next }), { ...action, kind: 'spot' }),
      );
    }
    case 'takeOver':
      return change(state, { ...marks, ...action.marks }, null);
    case 'propose':
      return {
        ...change(state, propose(marks, action.proposal, extent), null),
        // Nothing of the person's own has changed yet.
        changes: state.changes,
      };
    case 'accept':
      return markAt(marks, action.ref) ? change(state, acceptMark(marks, action.ref)) : state;
    case 'acceptAll':
      return change(state, acceptEvery(marks));
    case 'refuseAll':
      return change(state, withoutProposed(marks), null);
    case 'undo': {
      const before = state.past.at(-1);
      return before ? jump(state, before, state.past.slice(0, -1), [marks, ...state.future]) : state;
    }
    case 'redo': {
      const [after, ...future] = state.future;
      return after ? jump(state, after, [...state.past, marks], future) : state;
    }
  }
}
