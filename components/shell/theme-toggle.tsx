'use client';
import { useSyncExternalStore } from 'react';
import { THEME_KEY } from './theme-script';

type Choice = 'system' | 'light' | 'dark';
const CHOICES: readonly { value: Choice; label: string }[] = [
  { value: 'system', label: 'As the device' },
  { value: 'light', label: 'Light' },
  { value: 'dark', label: 'Dark' },
];

function subscribe(onChange: () => void) {
  const watch = new MutationObserver(onChange);
  watch.observe(document.documentElement, { attributes: true, attributeFilter: ['data-theme'] });
  return () => watch.disconnect();
}

function choose(choice: Choice) {
  const root = document.documentElement;
  if (choice === 'system') delete root.dataset.theme;
  else root.dataset.theme = choice;
  try {
    if (choice === 'system') localStorage.removeItem(THEME_KEY);
    else localStorage.setItem(THEME_KEY, choice);
  } catch {
    // Storage is switched off: the choice holds for this page only.
  }
}

/** Light, dark, or as the device says. */
export function ThemeToggle() {
  const current = useSyncExternalStore<Choice>(
    subscribe,
    () => (document.documentElement.dataset.theme as Choice | undefined) ?? 'system',
    () => 'system',
  );
  return (
    <div
      role="group"
      aria-label="Theme"
      className="inline-flex self-start overflow-hidden rounded border border-line-strong no-print"
    >
      {CHOICES.map(({ value, label }) => (
        <button
          key={value}
          type="button"
          aria-pressed={current === value}
          onClick={() => choose(value)}
          className={
            'min-h-target min-w-target px-3 text-sm -outline-offset-3 ' +
            (current === value
              ? 'bg-glass font-bold text-glass-on'
              : 'bg-paper-raised text-ink hover:bg-paper-sunk')
          }
        >
          {label}
        </button>
      ))}
    </div>
  );
}
