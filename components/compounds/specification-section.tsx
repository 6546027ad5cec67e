import Link from 'next/link';
import { limitsText } from '@/components/specifications/limits-text';
import { buttonClass } from '@/components/ui/button-class';
import type { SpecificationJson } from '@/lib/acceptance/specification-schema';

type SpecificationSectionProps = {
  compoundId: string;
  name: string;
  /** Editions in force in the reader's groups. */
  inForce: readonly SpecificationJson[];
  mayWrite: boolean;
};

/** What a fraction must show before it may be signed off, as it stands now; the editions have a page of their own. */
export function SpecificationSection({ compoundId, name, inForce, mayWrite }: SpecificationSectionProps) {
  return (
    <div className="flex flex-col items-start gap-3">
      {inForce.length === 0 ? (
        <p>
          None is in force in your groups. Fractions of {name} stay incomplete until a PI writes and approves
          one.
        </p>
      ) : (
        inForce.map((edition) => (
          <section key={edition.id} className="w-full">
            <h3 className="text-base font-bold">
              {edition.grade}, edition {edition.edition}
            </h3>
            <ul className="list-disc pl-5">
              {limitsText(edition.criteria).map((line) => (
                <li key={line}>{line}</li>
              ))}
            </ul>
            <p className="text-sm text-ink-soft">
              {edition.group.name}; {edition.decisionRule} acceptance; approved{' '}
              {edition.approvedAt?.slice(0, 10)} by {edition.approvedBy}
            </p>
          </section>
        ))
      )}
      <Link className={buttonClass()} href={`/compounds/${compoundId}/specifications`}>
        {mayWrite ? 'Editions, and write a new one' : 'All editions'}
      </Link>
    </div>
  );
}
