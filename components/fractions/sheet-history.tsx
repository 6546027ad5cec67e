import Link from 'next/link';
import { StateMark } from '@/components/states/state-mark';
import { DataTable } from '@/components/ui/data-table';
import type { FractionSheet } from '@/lib/acceptance/fraction-sheet-schema';

const time = (iso: string) => `${iso.slice(0, 16).replace('T', ' ')} UTC`;

/** Signatures, in force and superseded; each with the code that anybody can check. */
export function SheetSignatures({ signatures }: { signatures: FractionSheet['signatures'] }) {
  if (signatures.length === 0)
    return <p className="text-ink-soft">Nobody has signed for this fraction yet.</p>;
  return (
    <ul className="flex flex-col gap-3">
      {signatures.map((signature) => (
        <li key={signature.id} className="rounded border border-line bg-paper-raised px-4 py-3">
          <p className={signature.inForce ? 'font-bold' : 'text-ink-soft'}>
            {signature.signer} ({signature.role === 'pi' ? 'PI' : signature.role}): {signature.meaning}
          </p>
          {signature.comment ? <p>{signature.comment}</p> : null}
          <p className="text-sm text-ink-soft">
            {time(signature.signedAt)};{' '}
            {signature.inForce
              ? 'in force'
              : `superseded ${signature.supersededAt ? time(signature.supersededAt) : ''}: ${signature.supersededReason}`}
          </p>
          <p>
            <Link
              href={`/verify/${signature.code}`}
              className="link inline-flex min-h-target items-center font-mono"
            >
              {signature.code}
            </Link>
          </p>
          <p className="font-mono text-xs break-all text-ink-soft">
            manifest SHA-256 {signature.manifestDigest}
          </p>
        </li>
      ))}
    </ul>
  );
}

type Transition = FractionSheet['transitions'][number];

/** The steps of the fraction's life, the newest first. */
export function SheetSteps({ transitions }: { transitions: Transition[] }) {
  return (
    <DataTable
      caption="Steps, the newest first"
      columns={[
        { key: 'at', header: 'When', rowHeader: true, cell: (row: Transition) => time(row.at) },
        { key: 'by', header: 'Who', cell: (row) => row.by },
        { key: 'to', header: 'Became', cell: (row) => <StateMark state={row.to} size="sm" look="plain" /> },
        { key: 'reason', header: 'Why', cell: (row) => row.reason ?? '' },
      ]}
      rows={transitions}
      rowKey={(row) => `${row.at} ${row.action}`}
      empty={<p className="text-ink-soft">Not submitted yet.</p>}
    />
  );
}
