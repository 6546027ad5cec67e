import { Button } from '@/components/ui/button';
import { Notice } from '@/components/ui/notice';

type DraftNoticeProps = { keptAt: string; onTake: () => void; onRefuse: () => void };

/** Offers marks that were not saved. Leaving them takes nothing away that was saved. */
export function DraftNotice({ keptAt, onTake, onRefuse }: DraftNoticeProps) {
  const when = new Date(keptAt).toLocaleString(undefined, { dateStyle: 'medium', timeStyle: 'short' });
  return (
    <Notice
      kind="needs you"
      title="Marks that were not saved are on this device"
      action={
        <div className="flex flex-wrap gap-2">
          <Button variant="primary" onClick={onTake}>
            Take them up again
          </Button>
          <Button onClick={onRefuse}>Discard them</Button>
        </div>
      }
    >
      You last changed them {when}. What was saved stays as it is either way.
    </Notice>
  );
}
