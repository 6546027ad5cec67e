'use client';
import 'sonner/dist/styles.css';
import { Toaster as Sonner, toast } from 'sonner';

/** Short messages that go away by themselves; nothing that has to be read is said only here. Mounted once, in the layout. */
export function Toaster() {
  return (
    <Sonner
      position="bottom-center"
      offset={{ bottom: '4.5rem' }}
      mobileOffset={{ bottom: '4.5rem' }}
      duration={6000}
      closeButton
      toastOptions={{
        style: {
          background: 'var(--paper-raised)',
          color: 'var(--ink)',
          border: '1px solid var(--line-strong)',
          borderRadius: '4px',
          fontFamily: 'inherit',
          fontSize: '0.9375rem',
        },
      }}
    />
  );
}

/** Says that a thing is done. */
export function sayDone(message: string, detail?: string) {
  toast(message, { description: detail });
}

/** Says that a thing did not work and what to do next; stays until it is closed. */
export function sayFailed(message: string, whatNext?: string) {
  toast.error(message, { description: whatNext, duration: Infinity });
}
