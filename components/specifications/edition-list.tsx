import type { SpecificationJson } from '@/lib/acceptance/specification-schema';
import { EmptyState } from '@/components/ui/empty-state';
import { ApproveButton } from './approve-button';
import { limitsText } from './limits-text';

type EditionListProps = { editions: SpecificationJson[]; whyNotApprove: (groupId: string) => string | null };

/** Editions, the newest first; old ones stay as they were written. */
export function EditionList({ editions, whyNotApprove }: EditionListProps) {
  if (editions.length === 0)
    return (
      <EmptyState title="No specification yet">
        Fractions of this compound stay incomplete until a PI writes one below and approves it.
      </EmptyState>
    );
  return (
    <ul className="grid grid-cols-1 gap-4 lg:grid-cols-2">
      {editions.map((edition) => (
        <li key={edition.id} className="rounded border border-line bg-paper-raised px-4 py-3">
          <h3 className="font-bold">
            {edition.grade}, edition {edition.edition}
          </h3>
          <p className={edition.inForce ? 'font-bold text-glass' : 'text-ink-soft'}>
            {edition.inForce
              ? 'in force'
              : edition.approvedAt
                ? 'followed by a later one'
                : 'waits for approval by a PI'}
          </p>
          <ul className="my-2 list-disc pl-5">
            {limitsText(edition.criteria).map((line) => (
              <li key={line}>{line}</li>
            ))}
          </ul>
          {edition.note ? <p>{edition.note}</p> : null}
          <p className="text-sm text-ink-soft">
            {edition.decisionRule} acceptance; {edition.group.name}; written {edition.createdAt.slice(0, 10)}{' '}
            by {edition.writtenBy}
            {edition.approvedAt
              ? `, approved ${edition.approvedAt.slice(0, 10)} by ${edition.approvedBy}`
              : ''}
          </p>
          {edition.approvedAt ? null : (
            <div className="mt-2">
              <ApproveButton
                id={edition.id}
                version={edition.version}
                whyNot={whyNotApprove(edition.group.id)}
              />
            </div>
          )}
        </li>
      ))}
    </ul>
  );
}
