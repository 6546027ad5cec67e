'use client';
import { Button } from '@/components/ui/button';
import { Dialog } from '@/components/ui/dialog';

type UnsureSaveDialogProps = {
  /** How many proposed marks nobody has decided; null while it is closed. */
  count: number | null;
  /** Why the marks without the proposed ones cannot be saved; null when they can. */
  whyNotWithout: string | null;
  whyNotWith: string | null;
  onClose: () => void;
  onSave: (withProposed: boolean) => void;
};

/** Asks about proposed marks before a save: none is saved unseen, none is lost by surprise. */
export function UnsureSaveDialog({
  count,
  whyNotWithout,
  whyNotWith,
  onClose,
  onSave,
}: UnsureSaveDialogProps) {
  return (
    <Dialog
      open={count !== null}
      onOpenChange={(open) => !open && onClose()}
      title={`Save without the ${count ?? 0} marks that are only proposed?`}
      description="The dashed marks in the photo were proposed, and you have neither accepted nor moved them."
      actions={
        <>
          <Button onClick={onClose}>Look at them again</Button>
          <Button disabledReason={whyNotWith} onClick={() => onSave(true)}>
            I have checked them: accept all and save
          </Button>
          <Button variant="primary" disabledReason={whyNotWithout} onClick={() => onSave(false)}>
            Save without them
          </Button>
        </>
      }
    />
  );
}
