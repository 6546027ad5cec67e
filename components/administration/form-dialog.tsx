'use client';
import { type FormEvent, type ReactNode, useId, useState } from 'react';
import { Button } from '@/components/ui/button';
import { Dialog } from '@/components/ui/dialog';
import { Notice } from '@/components/ui/notice';
import { ApiError } from '@/lib/http/client';

type FormDialogProps = {
  /** The words on the button that opens it, and its title. */
  title: string;
  confirmLabel: string;
  variant?: 'primary' | 'secondary';
  /** Draws the fields; gets what the server said about each by name. */
  children: (errors: Record<string, string>) => ReactNode;
  /** Sends the form; throws ApiError with what is wrong. */
  onSend: (form: FormData) => Promise<void>;
};

/** A button, and behind it a dialog with a form that stays as typed until the server has taken it. */
export function FormDialog({
  title,
  confirmLabel,
  variant = 'secondary',
  children,
  onSend,
}: FormDialogProps) {
  const formId = useId();
  const [open, setOpen] = useState(false);
  const [busy, setBusy] = useState(false);
  const [problem, setProblem] = useState<ApiError | null>(null);
  async function submit(event: FormEvent<HTMLFormElement>) {
    event.preventDefault();
    if (busy) return;
    const form = new FormData(event.currentTarget);
    setBusy(true);
    setProblem(null);
    try {
      await onSend(form);
      setOpen(false);
    } catch (error) {
      setProblem(error instanceof ApiError ? error : new ApiError(0, 'Something went wrong. Try again.'));
    } finally {
      setBusy(false);
    }
  }
  return (
    <>
      <Button variant={variant} onClick={() => setOpen(true)}>
        {title}
      </Button>
      <Dialog
        open={open}
        onOpenChange={setOpen}
        title={title}
        actions={
          <>
            <Button onClick={() => setOpen(false)}>Cancel</Button>
            <Button variant="primary" type="submit" form={formId} busy={busy}>
              {confirmLabel}
            </Button>
          </>
        }
      >
        <form id={formId} onSubmit={(event) => void submit(event)} className="flex flex-col gap-4">
          {problem ? <Notice kind="fails" live title={problem.detail} /> : null}
          {children(Object.fromEntries((problem?.errors ?? []).map((e) => [e.path, e.message])))}
        </form>
      </Dialog>
    </>
  );
}
