'use client';
import { useRef } from 'react';
import { Button } from '@/components/ui/button';
import { plainName, proposedWords } from './mark-names';
import type { MarkRef } from './marks';
import { proposedRefs } from './proposals';
import type { MarksHandle } from './use-marks';

/** Every proposed mark in words, each with its own answer. */
export function ProposedList({ handle }: { handle: MarksHandle }) {
  const { state, dispatch } = handle;
  const list = useRef<HTMLUListElement>(null);
  const open = proposedRefs(state.marks);
  if (open.length === 0) return null;
  function decide(type: 'accept' | 'remove', ref: MarkRef, row: number) {
    dispatch({ type, ref });
    // The keys go on with the next mark, since the button that was pressed is gone.
    requestAnimationFrame(() => {
      const rows = list.current?.querySelectorAll('li') ?? [];
      rows[Math.min(row, rows.length - 1)]?.querySelector('button')?.focus();
    });
  }
  return (
    <details className="mt-3 rounded border border-dashed border-line-strong px-4 py-1">
      <summary className="flex min-h-target items-center font-bold">
        Decide the {open.length} proposed marks one by one
      </summary>
      <ul ref={list} className="divide-y divide-line pb-2">
        {open.map((ref, row) => {
          const name = plainName(state.marks, ref);
          return (
            <li key={JSON.stringify(ref)} className="flex flex-wrap items-center gap-x-3 py-1">
              <span className="min-w-0 flex-1 basis-40">
                {name} <span className="text-sm text-ink-soft">{proposedWords(state.marks, ref)}</span>
              </span>
              <span className="flex">
                <Button
                  variant="quiet"
                  aria-label={`Accept: ${name}`}
                  onClick={() => decide('accept', ref, row)}
                >
                  Accept
                </Button>
                <Button
                  variant="quiet"
                  aria-label={`Take away: ${name}`}
                  onClick={() => decide('remove', ref, row)}
                >
                  Take away
                </Button>
              </span>
            </li>
          );
        })}
      </ul>
    </details>
  );
}
