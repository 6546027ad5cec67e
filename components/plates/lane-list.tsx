'use client';
import { LaneEditor, type RunFraction } from './lane-editor';
import type { MarksHandle } from './use-marks';

/** What each lane holds. */
export function LaneList({ handle, fractions }: { handle: MarksHandle; fractions: readonly RunFraction[] }) {
  const { state, dispatch } = handle;
  const { marks, selected } = state;
  const chosen = selected?.kind === 'lane' || selected?.kind === 'spot' ? selected.lane : null;
  return (
    <section aria-labelledby="lanes-heading">
      <h2 id="lanes-heading" className="text-lg">
        Lanes
      </h2>
      {marks.lanes.length === 0 ? (
        <p className="text-ink-soft">No lane yet: choose “Lane” above the photo and press on each.</p>
      ) : (
        <ol className="flex flex-col gap-3">
          {marks.lanes.map((lane, index) => (
            <LaneEditor
              key={index}
              lane={lane}
              number={index + 1}
              fractions={fractions}
              selected={chosen === index}
              onChange={(change) => dispatch({ type: 'changeLane', lane: index, change })}
              onRemove={() => dispatch({ type: 'remove', ref: { kind: 'lane', lane: index } })}
            />
          ))}
        </ol>
      )}
    </section>
  );
}
