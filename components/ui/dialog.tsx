'use client';
import { Dialog as Radix } from 'radix-ui';
import { useRef, type ReactNode } from 'react';

type DialogProps = {
  open: boolean;
  onOpenChange: (open: boolean) => void;
  title: string;
  /** Read out when the dialog opens. */
  description?: ReactNode;
  children?: ReactNode;
  /** Buttons, at the end; the wanted one last. */
  actions?: ReactNode;
  wide?: boolean;
};

export const SCRIM = 'fixed inset-0 z-40 bg-[rgb(15_13_10/0.55)]';

/** A sheet over the page: from the bottom edge on a phone, centred on a desk. Keeps the focus and gives it back. */
export function Dialog({
  open,
  onOpenChange,
  title,
  description,
  children,
  actions,
  wide = false,
}: DialogProps) {
  const openerRef = useRef<HTMLElement | null>(null);
  return (
    <Radix.Root open={open} onOpenChange={onOpenChange}>
      <Radix.Portal>
        <Radix.Overlay className={SCRIM} />
        <Radix.Content
          // The dialog is opened by state, not by a trigger of its own, so it remembers who had the focus.
          onOpenAutoFocus={() => {
            openerRef.current = document.activeElement instanceof HTMLElement ? document.activeElement : null;
          }}
          onCloseAutoFocus={(event) => {
            event.preventDefault();
            openerRef.current?.focus();
          }}
          {...(description ? {} : { 'aria-describedby': undefined })}
          className={
            'fixed inset-x-0 bottom-0 z-50 flex max-h-[92dvh] flex-col rounded-t-lg border border-line bg-paper-raised shadow-lifted ' +
            'sm:inset-auto sm:top-1/2 sm:left-1/2 sm:w-[calc(100vw-2rem)] sm:-translate-x-1/2 sm:-translate-y-1/2 sm:rounded-lg ' +
            (wide ? 'sm:max-w-4xl' : 'sm:max-w-lg')
          }
        >
          <div className="flex items-start justify-between gap-4 border-b border-line py-3 pr-2 pl-5">
            <div className="min-w-0 pt-1.5">
              <Radix.Title className="text-lg">{title}</Radix.Title>
              {description ? (
                <Radix.Description asChild>
                  <div className="mt-1 text-ink-soft">{description}</div>
                </Radix.Description>
              ) : null}
            </div>
            <Radix.Close
              aria-label="Close"
              className="flex size-target shrink-0 items-center justify-center rounded text-ink-soft hover:bg-paper-sunk hover:text-ink"
            >
              <svg width="18" height="18" viewBox="0 0 18 18" aria-hidden="true">
                <path
                  d="m4 4 10 10M14 4 4 14"
                  stroke="currentColor"
                  strokeWidth="1.75"
                  strokeLinecap="round"
                />
              </svg>
            </Radix.Close>
          </div>
          <div className="overflow-y-auto px-5 py-4">{children}</div>
          {actions ? (
            <div className="flex flex-col-reverse gap-2 border-t border-line px-5 py-3 sm:flex-row sm:justify-end">
              {actions}
            </div>
          ) : null}
        </Radix.Content>
      </Radix.Portal>
    </Radix.Root>
  );
}
