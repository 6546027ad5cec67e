'use client';
import { StateMark } from '@/components/states/state-mark';
import { cuts, type Cut } from '@/lib/distillation/fraction-states';

const meanings: Record<Cut, string> = {
  'fore-run': 'before the heart',
  heart: 'what is wanted',
  tail: 'after the heart',
  residue: 'stayed in the still',
  trap: 'caught by the cold trap',
};

type CutChoiceProps = { value: Cut | ''; onChange: (cut: Cut) => void; error?: string | null };

/** The five cuts as large targets: one tap with a glove on. */
export function CutChoice({ value, onChange, error }: CutChoiceProps) {
  return (
    <fieldset aria-describedby={error ? 'cut-error' : undefined}>
      <legend className="mb-1 font-bold">Cut</legend>
      <div className="grid grid-cols-2 gap-2 sm:grid-cols-3">
        {cuts.map((cut) => (
          <label
            key={cut}
            className={`flex min-h-14 items-center gap-3 rounded border px-3 py-2 ${
              value === cut
                ? 'border-glass bg-glass-wash'
                : 'border-line-strong bg-paper-raised hover:border-ink'
            }`}
          >
            <input
              type="radio"
              name="cut"
              value={cut}
              checked={value === cut}
              onChange={() => onChange(cut)}
              className="size-5 shrink-0 accent-glass"
            />
            <span className="flex min-w-0 flex-col">
              <StateMark state={cut} look="plain" />
              <span className="text-sm text-ink-soft">{meanings[cut]}</span>
            </span>
          </label>
        ))}
      </div>
      <p id="cut-error" role="alert" className={error ? 'mt-1 text-sm font-bold text-fails' : 'hidden'}>
        {error}
      </p>
    </fieldset>
  );
}
