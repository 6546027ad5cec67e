'use client';
import { type FormEvent, type ReactNode, useId, useState } from 'react';
import { Button } from '@/components/ui/button';
import type { ButtonVariant } from '@/components/ui/button-class';
import { Dialog } from '@/components/ui/dialog';
import { Notice } from '@/components/ui/notice';
import { ApiError } from '@/lib/http/client';

type FormSheetProps = {
  /** The words on the button that opens the sheet. */
  button: string;
  variant?: ButtonVariant;
  /** Why the button may not be used; it stays visible. */
  disabledReason?: string | null;
  title: string;
  description?: ReactNode;
  confirm: string;
  /** Draws the fields; gets what is wrong with each by name. */
  children: (errors: Record<string, string>) => ReactNode;
  /** Sends the form. What it throws is shown and the form stays as typed. */
  onSend: (form: FormData) => Promise<void>;
};

/** A button and the sheet with a form behind it. */
export function FormSheet({
  button,
  variant,
  disabledReason,
  title,
  description,
  confirm,
  children,
  onSend,
}: FormSheetProps) {
  const formId = useId();
  const [open, setOpen] = useState(false);
  const [busy, setBusy] = useState(false);
  const [problem, setProblem] = useState<ApiError | null>(null);
  async function send(event: FormEvent<HTMLFormElement>) {
    event.preventDefault();
    if (busy) return;
    setBusy(true);
    setProblem(null);
    try {
      await onSend(new FormData(event.currentTarget));
      setOpen(false);
    } catch (error) {
      setProblem(
        error instanceof ApiError
          ? error
          : new ApiError(0, 'This did not work. Try again, what you typed is kept.'),
      );
    } finally {
      setBusy(false);
    }
  }
  const errors = Object.fromEntries((problem?.errors ?? []).map(({ path, message }) => [path, message]));
  return (
    <>
      <Button variant={variant} disabledReason={disabledReason} onClick={() => setOpen(true)}>
        {button}
      </Button>
      <Dialog
        open={open}
        onOpenChange={setOpen}
        title={title}
        description={description}
        actions={
          <>
            <Button onClick={() => setOpen(false)}>Cancel</Button>
            <Button variant="primary" type="submit" form={formId} busy={busy}>
              {confirm}
            </Button>
          </>
        }
      >
        <form id={formId} noValidate onSubmit={(event) => void send(event)} className="flex flex-col gap-4">
          {problem ? (
            <Notice kind="fails" live title="Not saved">
              {problem.detail}
            </Notice>
          ) : null}
          {children(errors)}
        </form>
      </Dialog>
    </>
  );
}
