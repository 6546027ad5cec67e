'use client';
import { Button } from '@/components/ui/button';
import { plainName, proposedWords, rfText } from './mark-names';
import { markAt } from './marks';
import type { MarksHandle } from './use-marks';

/**
 * What can be done to the mark that is chosen, without a keyboard. Under the photo and always as high, so that the photo
 * never slips away under a finger.
 */
export function SelectedBar({ handle }: { handle: MarksHandle }) {
  const { state, dispatch, measured } = handle;
  const { marks, selected } = state;
  const mark = selected && markAt(marks, selected);
  if (!selected || !mark)
    return <p className="flex min-h-target items-center text-sm text-ink-soft">No mark is chosen.</p>;
  const result = selected.kind === 'spot' ? measured?.lanes[selected.lane]?.spots[selected.spot] : null;
  const proposed = proposedWords(marks, selected);
  return (
    <div className="flex min-h-target flex-wrap items-center gap-x-3 gap-y-1">
      <p className="min-w-0 flex-1 basis-40 text-sm">
        <span className="font-bold">{plainName(marks, selected)}</span>
        {result ? `, Rf ${rfText(result.rf, result.rfUncertainty)}` : ''}
        {proposed ? `, ${proposed}` : ''}
      </p>
      <span className="flex gap-1">
        {proposed ? (
          <Button onClick={() => dispatch({ type: 'accept', ref: selected })}>Accept it</Button>
        ) : null}
        <Button variant="quiet" onClick={() => dispatch({ type: 'remove', ref: selected })}>
          Take it away
        </Button>
      </span>
    </div>
  );
}
