'use client';
import type { ReactNode } from 'react';
import { Button } from './button';
import { Dialog } from './dialog';

type ConfirmDialogProps = {
  open: boolean;
  onOpenChange: (open: boolean) => void;
  /** A question that names the thing: "Revoke the token of GC-2?" */
  question: string;
  /** What will no longer be there or no longer work. */
  goes: ReactNode;
  /** What is kept all the same. */
  stays: ReactNode;
  /** The verb of the deed, as on the button that opened this. */
  confirmLabel: string;
  onConfirm: () => void;
  busy?: boolean;
  danger?: boolean;
  /** Further input, such as a reason. */
  children?: ReactNode;
  disabledReason?: string | null;
};

/** Asks before something that cannot simply be taken back, and says what goes and what stays. */
export function ConfirmDialog(props: ConfirmDialogProps) {
  const {
    open,
    onOpenChange,
    question,
    goes,
    stays,
    confirmLabel,
    onConfirm,
    busy,
    danger = true,
    children,
  } = props;
  return (
    <Dialog
      open={open}
      onOpenChange={onOpenChange}
      title={question}
      actions={
        <>
          <Button onClick={() => onOpenChange(false)}>Leave as it is</Button>
          <Button
            variant={danger ? 'danger' : 'primary'}
            busy={busy}
            onClick={onConfirm}
            disabledReason={props.disabledReason}
          >
            {confirmLabel}
          </Button>
        </>
      }
    >
      <dl className="grid grid-cols-[auto_1fr] gap-x-4 gap-y-2">
        <dt className="font-bold">Goes</dt>
        <dd>{goes}</dd>
        <dt className="font-bold">Stays</dt>
        <dd>{stays}</dd>
      </dl>
      {children ? <div className="mt-4 flex flex-col gap-4">{children}</div> : null}
    </Dialog>
  );
}
