import { type Lane, listOf, type MarkRef, type Marks, type MarkPoint, type Point, type Spot } from './marks';

export type Extent = { width: number; height: number };

export function within(point: Point, { width, height }: Extent): Point {
  return { x: Math.min(width, Math.max(0, point.x)), y: Math.min(height, Math.max(0, point.y)) };
}

export function replaceAt<T>(list: readonly T[], index: number, value: T): T[] {
  return list.map((one, at) => (at === index ? value : one));
}

/** The same mark, no longer a mere proposal. */
export function acceptedMark<T extends { proposed?: number }>(mark: T): T {
  const { proposed: _gone, ...rest } = mark;
  return rest as T;
}

/** A lane with a change; whoever touches a lane, or a spot in it, has accepted the lane. */
export function withLane(marks: Marks, index: number, change: Partial<Lane>): Marks {
  return {
    ...marks,
    lanes: replaceAt(marks.lanes, index, { ...acceptedMark(marks.lanes[index]!), ...change }),
  };
}

/** A mark that a person moved is that person's, no longer proposed. */
export function moveMark(marks: Marks, ref: MarkRef, to: Point): Marks {
  if (ref.kind === 'lane') return withLane(marks, ref.lane, { x: to.x });
  if (ref.kind === 'spot') {
    const { spots } = marks.lanes[ref.lane]!;
    const spot = { ...acceptedMark(spots[ref.spot]!), x: to.x, y: to.y };
    return withLane(marks, ref.lane, { spots: replaceAt(spots, ref.spot, spot) });
  }
  const key = listOf[ref.kind];
  return { ...marks, [key]: replaceAt<MarkPoint>(marks[key], ref.index, { x: to.x, y: to.y }) };
}

/** Takes a mark away; a lane goes with its spots. A lane stays what it was when a spot of it goes. */
export function removeMark(marks: Marks, ref: MarkRef): Marks {
  const drop = <T>(list: readonly T[], index: number) => list.filter((_one, at) => at !== index);
  if (ref.kind === 'lane') return { ...marks, lanes: drop(marks.lanes, ref.lane) };
  if (ref.kind === 'spot') {
    const lane = marks.lanes[ref.lane]!;
    const lanes = replaceAt(marks.lanes, ref.lane, { ...lane, spots: drop(lane.spots, ref.spot) });
    return { ...marks, lanes };
  }
  const key = listOf[ref.kind];
  return { ...marks, [key]: drop(marks[key], ref.index) };
}

/** A proposed mark becomes one of the person's, where it is; a spot takes its lane along. */
export function acceptMark(marks: Marks, ref: MarkRef): Marks {
  if (ref.kind === 'lane') return withLane(marks, ref.lane, {});
  if (ref.kind === 'spot') {
    const { spots } = marks.lanes[ref.lane]!;
    return withLane(marks, ref.lane, { spots: replaceAt(spots, ref.spot, acceptedMark(spots[ref.spot]!)) });
  }
  const key = listOf[ref.kind];
  return { ...marks, [key]: replaceAt(marks[key], ref.index, acceptedMark(marks[key][ref.index]!)) };
}

export function newLane(marks: Pick<Marks, 'lanes'>, x: number): Lane {
  return {
    label: `${marks.lanes.length + 1}`,
    x,
    subject: { kind: null },
    dilutionPercent: '',
    spots: [],
  };
}

/** A spot in a lane; a first lane is made where there is none. */
export function addSpotTo(marks: Marks, index: number, at: Point): { marks: Marks; ref: MarkRef } {
  const lanes = marks.lanes.length === 0 ? [newLane(marks, at.x)] : marks.lanes;
  const lane = Math.min(lanes.length - 1, Math.max(0, index));
  const spots: Spot[] = [...lanes[lane]!.spots, { ...at, shape: 'spot' }];
  return {
    marks: withLane({ ...marks, lanes }, lane, { spots }),
    ref: { kind: 'spot', lane, spot: spots.length - 1 },
  };
}
