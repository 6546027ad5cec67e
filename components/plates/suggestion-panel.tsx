'use client';
import { Button } from '@/components/ui/button';
import { Notice } from '@/components/ui/notice';
import { Progress } from '@/components/ui/progress';
import { confidenceWords, proposedRefs } from './proposals';
import type { MarksHandle } from './use-marks';
import type { SuggestionHandle } from './use-suggestion';

type SuggestionPanelProps = {
  handle: MarksHandle;
  suggestion: SuggestionHandle;
  /** Nothing is marked on this photo yet: the proposal is the natural first step. */
  isFresh: boolean;
};

const countOf = (count: number, one: string) => `${count} ${one}${count === 1 ? '' : 's'}`;

/** Asks for a proposal, says how sure it is, and takes or leaves the whole of it. Nothing is saved by it. */
export function SuggestionPanel({ handle, suggestion, isFresh }: SuggestionPanelProps) {
  const { state, dispatch, proposal } = handle;
  const { state: now, ask } = suggestion;
  const open = proposedRefs(state.marks);
  const of = (...kinds: string[]) => open.filter((ref) => kinds.includes(ref.kind)).length;
  const isEmpty = now.step === 'answered' && open.length === 0;
  return (
    <div className="mb-2 flex flex-col gap-3">
      <div className="flex flex-wrap items-center gap-x-4 gap-y-1">
        <Button variant={isFresh ? 'primary' : 'secondary'} busy={now.step === 'asking'} onClick={ask}>
          Propose marks
        </Button>
        <p className="min-w-0 flex-1 basis-56 text-sm text-ink-soft">
          Looks for corners, lines, lanes and spots in the photo. You accept, move or take away each; nothing
          is saved unseen.
        </p>
      </div>
      {now.step === 'asking' ? <Progress label="Looking at the photo" share={null} /> : null}
      {now.step === 'failed' ? (
        <Notice kind="fails" title="No proposal" live>
          {now.words}
        </Notice>
      ) : null}
      {open.length > 0 ? (
        <Notice
          kind="needs you"
          live
          title={`Proposed${proposal?.confidence === undefined ? '' : ` (${confidenceWords(proposal.confidence)})`}`}
          action={
            <div className="flex flex-wrap gap-2">
              <Button variant="primary" onClick={() => dispatch({ type: 'acceptAll' })}>
                Accept all
              </Button>
              <Button onClick={() => dispatch({ type: 'refuseAll' })}>Take all away</Button>
            </div>
          }
        >
          <p>
            {[
              countOf(of('corner'), 'corner'),
              countOf(of('baseline', 'front'), 'point') + ' of lines',
              countOf(of('lane'), 'lane'),
              countOf(of('spot'), 'spot'),
            ].join(', ')}
            : the dashed marks. Check them against the photo.
          </p>
          {proposal?.reasons?.length ? (
            <ul className="list-disc pl-5">
              {proposal.reasons.map((reason) => (
                <li key={reason}>{reason}</li>
              ))}
            </ul>
          ) : null}
        </Notice>
      ) : null}
      <p role="status" className={isEmpty ? 'text-sm' : 'sr-only'}>
        {isEmpty
          ? proposal && proposal.lanes.length + proposal.baseline.length + proposal.corners.length === 0
            ? `Nothing was found to propose. ${proposal.reasons?.join(' ') ?? ''} Mark the plate by hand.`
            : 'No proposed mark is left to decide.'
          : ''}
      </p>
    </div>
  );
}
