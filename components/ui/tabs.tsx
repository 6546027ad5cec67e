'use client';
import { Tabs as Radix } from 'radix-ui';
import type { ReactNode } from 'react';

export type Tab = { value: string; label: ReactNode; content: ReactNode };
type TabsProps = {
  tabs: readonly Tab[];
  label: string;
  defaultValue?: string;
  value?: string;
  onValueChange?: (v: string) => void;
};

/** Tabs by the WAI-ARIA pattern; the row scrolls sideways where it does not fit. */
export function Tabs({ tabs, label, defaultValue, value, onValueChange }: TabsProps) {
  return (
    <Radix.Root defaultValue={defaultValue ?? tabs[0]?.value} value={value} onValueChange={onValueChange}>
      <Radix.List aria-label={label} className="flex gap-1 overflow-x-auto border-b border-line no-print">
        {tabs.map((tab) => (
          <Radix.Trigger
            key={tab.value}
            value={tab.value}
            className={
              'min-h-target shrink-0 border-b-[3px] border-transparent px-3 font-bold whitespace-nowrap text-ink-soft ' +
              'outline-offset-[-3px] hover:text-ink data-[state=active]:border-glass data-[state=active]:text-ink'
            }
          >
            {tab.label}
          </Radix.Trigger>
        ))}
      </Radix.List>
      {tabs.map((tab) => (
        <Radix.Content key={tab.value} value={tab.value} className="pt-4">
          {tab.content}
        </Radix.Content>
      ))}
    </Radix.Root>
  );
}
