import { literatureConditionsText, literatureValueText } from '@/lib/compounds/literature-text';
import type { LiteratureValueJson } from '@/lib/compounds/schema';
import { LiteratureDialog } from './literature-dialog';
import { PreferDialog } from './prefer-dialog';

type LiteraturePropertyProps = {
  compoundId: string;
  property: string;
  values: readonly LiteratureValueJson[];
  /** Null: this person may add and correct. */
  whyNotWrite: string | null;
};

/** The values of one property: those in force, preferred first, and the replaced ones folded away. */
export function LiteratureProperty({ compoundId, property, values, whyNotWrite }: LiteraturePropertyProps) {
  const inForce = values.filter(({ replacedAt }) => replacedAt === null);
  const replaced = values.filter(({ replacedAt }) => replacedAt !== null);
  inForce.sort((one, other) => Number(other.preferred) - Number(one.preferred));
  return (
    <section aria-label={property} className="border-t border-line py-3">
      <h3 className="text-base font-bold">{property.charAt(0).toUpperCase() + property.slice(1)}</h3>
      <ul>
        {inForce.map((value) => (
          <li key={value.id} className="flex flex-wrap items-start justify-between gap-x-4 py-1">
            <ValueText value={value} />
            {whyNotWrite === null ? (
              <span className="flex flex-wrap">
                {value.preferred ? null : (
                  <PreferDialog compoundId={compoundId} value={value} disabledReason={null} />
                )}
                <LiteratureDialog compoundId={compoundId} corrects={value} disabledReason={null} />
              </span>
            ) : null}
          </li>
        ))}
      </ul>
      {replaced.length > 0 ? (
        <details className="mt-1">
          <summary className="flex min-h-target cursor-pointer items-center text-sm text-ink-soft">
            {replaced.length === 1 ? '1 replaced value' : `${replaced.length} replaced values`}
          </summary>
          <ul className="border-l-2 border-line pl-3">
            {replaced.map((value) => (
              <li key={value.id} className="py-1">
                <ValueText value={value} />
                <Replacement value={value} by={values.find(({ corrects }) => corrects === value.id)} />
              </li>
            ))}
          </ul>
        </details>
      ) : null}
    </section>
  );
}

function ValueText({ value }: { value: LiteratureValueJson }) {
  const conditions = literatureConditionsText(value);
  return (
    <div className="min-w-0 flex-1 basis-64">
      <p>
        <span className={value.preferred ? 'font-bold' : value.replacedAt ? 'line-through' : ''}>
          {literatureValueText(value)}
        </span>
        {conditions ? <span className="text-ink-soft"> {conditions}</span> : null}
        {value.preferred ? (
          <span className="ml-2 rounded border border-glass/30 bg-glass-wash px-1.5 py-0.5 text-xs font-bold whitespace-nowrap text-glass">
            preferred
          </span>
        ) : null}
      </p>
      <p className="text-sm break-words text-ink-soft">
        {value.source}
        {value.note ? `. ${value.note}` : ''}
        {value.addedBy ? `. Added by ${value.addedBy}, ${value.createdAt.slice(0, 10)}` : ''}
      </p>
    </div>
  );
}

function Replacement({ value, by }: { value: LiteratureValueJson; by: LiteratureValueJson | undefined }) {
  return (
    <p className="text-sm">
      Replaced on {value.replacedAt?.slice(0, 10)}
      {by ? ` by ${literatureValueText(by)}` : ''}
      {by?.reason ? `: ${by.reason}` : ''}
    </p>
  );
}
