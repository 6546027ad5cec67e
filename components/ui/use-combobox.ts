'use client';
import { useEffect, useRef, useState, type KeyboardEvent } from 'react';

export type ComboboxOption = {
  value: string;
  label: string;
  /** Second line: synonyms, CAS number. */ detail?: string;
};
export type ComboboxSearch = (query: string, signal: AbortSignal) => Promise<readonly ComboboxOption[]>;
type Found = { state: 'idle' | 'searching' | 'done' | 'failed'; options: readonly ComboboxOption[] };

/** The behaviour of a combobox with a list of its own: waits for a pause in typing, drops late answers, moves by arrow keys. */
export function useCombobox(
  search: ComboboxSearch,
  onChoose: (option: ComboboxOption | null) => void,
  initial: ComboboxOption | null,
) {
  const [chosen, setChosen] = useState(initial);
  const [text, setText] = useState(initial?.label ?? '');
  const [open, setOpen] = useState(false);
  const [active, setActive] = useState(-1);
  const [found, setFound] = useState<Found>({ state: 'idle', options: [] });
  const searchRef = useRef(search);
  useEffect(() => {
    searchRef.current = search;
  });

  useEffect(() => {
    if (!open) return;
    const abort = new AbortController();
    const timer = setTimeout(() => {
      setFound((before) => ({ ...before, state: 'searching' }));
      searchRef
        .current(chosen && text === chosen.label ? '' : text.trim(), abort.signal)
        .then((options) => !abort.signal.aborted && setFound({ state: 'done', options }))
        .catch(() => !abort.signal.aborted && setFound({ state: 'failed', options: [] }));
    }, 180);
    return () => {
      clearTimeout(timer);
      abort.abort();
    };
  }, [open, text, chosen]);

  function choose(option: ComboboxOption | null) {
    setChosen(option);
    setText(option?.label ?? '');
    setOpen(false);
    setActive(-1);
    onChoose(option);
  }
  function type(next: string) {
    setText(next);
    setOpen(true);
    setActive(-1);
    if (chosen) {
      setChosen(null);
      onChoose(null);
    }
  }
  /** Leaving with half a word typed: nothing is chosen by accident, and the text shows what is chosen. */
  function leave() {
    setOpen(false);
    setText(chosen?.label ?? '');
  }
  function onKeyDown(event: KeyboardEvent) {
    const last = found.options.length - 1;
    if (event.key === 'ArrowDown' || event.key === 'ArrowUp') {
      event.preventDefault();
      if (!open) return setOpen(true);
      const step = event.key === 'ArrowDown' ? 1 : -1;
      setActive((at) => (last < 0 ? -1 : at + step > last ? 0 : at + step < 0 ? last : at + step));
    } else if (event.key === 'Enter' && open && found.options[active]) {
      event.preventDefault();
      choose(found.options[active]);
    } else if (event.key === 'Escape' && (open || text)) {
      event.preventDefault();
      event.stopPropagation();
      if (open) setOpen(false);
      else choose(null);
    }
  }
  return { chosen, text, open, active, found, setOpen, setActive, choose, type, leave, onKeyDown };
}
