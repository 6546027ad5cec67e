'use client';
import { useState } from 'react';
import { Button } from './button';

/** Copies a text (a digest, a link, a token shown once). Where the browser refuses, it says to copy by hand. */
export function CopyButton({ text, label = 'Copy' }: { text: string; label?: string }) {
  const [outcome, setOutcome] = useState<'' | 'Copied' | 'Select and copy it by hand'>('');
  async function copy() {
    try {
      await navigator.clipboard.writeText(text);
      setOutcome('Copied');
    } catch {
      setOutcome('Select and copy it by hand');
    }
    setTimeout(() => setOutcome(''), 4000);
  }
  return (
    <span className="inline-flex items-center gap-2">
      <Button variant="secondary" onClick={copy}>
        {label}
      </Button>
      <span role="status" className="text-sm text-ink-soft">
        {outcome}
      </span>
    </span>
  );
}
