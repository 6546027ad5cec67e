'use client';
import { useEffect, useRef, useState } from 'react';
import { Field } from '@/components/ui/field';

type TypedFilterProps = { label: string; hint: string; value: string; onChange: (value: string) => void };

/** A filter that is typed: it takes effect after a short pause, so that the list does not jump at each letter. */
export function TypedFilter({ label, hint, value, onChange }: TypedFilterProps) {
  const [text, setText] = useState(value);
  const [seen, setSeen] = useState(value);
  // The address changed from outside, for example by a chip: follow it, unless it is what was typed here.
  if (value !== seen) {
    setSeen(value);
    if (value !== text.trim()) setText(value);
  }
  const change = useRef(onChange);
  useEffect(() => {
    change.current = onChange;
  });
  useEffect(() => {
    if (text.trim() === value) return;
    const timer = setTimeout(() => change.current(text.trim()), 350);
    return () => clearTimeout(timer);
  }, [text, value]);
  return (
    <Field
      label={label}
      hint={hint}
      value={text}
      autoComplete="off"
      onChange={(event) => setText(event.target.value)}
    />
  );
}
