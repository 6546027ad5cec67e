'use client';
import { useState } from 'react';
import { Combobox } from '@/components/ui/combobox';
import { buttonClass } from '@/components/ui/button-class';
import { searchCompounds } from './compound-search';

export type Chosen = { id: string; name: string };
type ImpuritiesFieldProps = {
  chosen: readonly Chosen[];
  onChange: (chosen: Chosen[]) => void;
  error?: string | null;
};

/** Compounds known or expected in the charge besides the target: one is searched, added, and can be taken off again. */
export function ImpuritiesField({ chosen, onChange, error }: ImpuritiesFieldProps) {
  // A new key empties the search after each choice.
  const [round, setRound] = useState(0);
  return (
    <div className="flex flex-col gap-2">
      <Combobox
        key={round}
        label="Known impurities"
        optional
        hint="Each of them must be seen by a test later; what is not listed here is not looked for."
        error={error}
        search={searchCompounds}
        nothingFound="Nothing found: a PI can add it under Compounds."
        onChoose={(option) => {
          if (!option) return;
          if (!chosen.some((each) => each.id === option.value)) {
            onChange([...chosen, { id: option.value, name: option.label }]);
          }
          setRound(round + 1);
        }}
      />
      {chosen.length > 0 ? (
        <ul aria-label="Chosen impurities" className="flex flex-wrap gap-2">
          {chosen.map((each) => (
            <li key={each.id}>
              <button
                type="button"
                className={buttonClass('secondary', 'font-normal')}
                onClick={() => onChange(chosen.filter((other) => other.id !== each.id))}
              >
                {each.name}
                <span aria-hidden="true">×</span>
                <span className="sr-only">: take off the list</span>
              </button>
            </li>
          ))}
        </ul>
      ) : null}
    </div>
  );
}
