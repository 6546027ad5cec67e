import { StateMark } from '@/components/states/state-mark';
import { Notice } from '@/components/ui/notice';
import type { CompoundJson } from '@/lib/compounds/schema';

/** What a plate can and cannot show of the compound, computed from structure and boiling point. */
export function PlatePanel({ plate }: { plate: CompoundJson['plate'] }) {
  return (
    <div className="flex flex-col gap-3">
      {plate.evaporates ? (
        <Notice kind="needs you" title="May leave the plate before anyone looks">
          An empty lane proves nothing about this compound. Use gas chromatography or the refractive index.
        </Notice>
      ) : (
        <p>
          {plate.evaporates === null
            ? 'No boiling point is kept, so nobody can say whether it stays on the plate.'
            : 'It boils high enough to stay on the plate.'}
        </p>
      )}
      <ul>
        {plate.visualisers.map(({ id, name, state, reason }) => (
          <li
            key={id}
            className="flex flex-wrap items-baseline justify-between gap-x-3 border-t border-line py-1.5"
          >
            <span className="font-bold">{name}</span>
            {state === 'uncertain' ? (
              <span className="text-sm font-bold text-ink-soft">uncertain</span>
            ) : (
              <StateMark state={state} size="sm" />
            )}
            <span className="w-full text-sm text-ink-soft">{reason}</span>
          </li>
        ))}
      </ul>
    </div>
  );
}
