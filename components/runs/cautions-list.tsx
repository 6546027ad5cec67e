import type { Caution } from '@/lib/distillation/cautions';
import { DEFERENCE } from '@/lib/distillation/cautions';
import { Notice } from '@/components/ui/notice';

type Shown = Pick<Caution, 'severity' | 'text' | 'basis'>;

/** The usual cautions, warnings first, with their basis. The sentence of deference stands once, for all of them. */
export function CautionsList({ cautions }: { cautions: readonly Shown[] }) {
  const warnings = cautions.filter((caution) => caution.severity === 'warning');
  const others = cautions.filter((caution) => caution.severity === 'caution');
  return (
    <Notice kind="needs you" title="Cautions for this still">
      <ul className="flex list-disc flex-col gap-2 pl-5">
        {[...warnings, ...others].map((caution) => (
          <li key={caution.text}>
            {caution.severity === 'warning' ? <strong>Warning: </strong> : null}
            {caution.text.replace(DEFERENCE, '').trim()}{' '}
            <span className="text-sm text-ink-soft">({caution.basis})</span>
          </li>
        ))}
      </ul>
      <p className="mt-2 font-bold">
        {DEFERENCE} A caution is never a permission, and none is no permission either.
      </p>
    </Notice>
  );
}
