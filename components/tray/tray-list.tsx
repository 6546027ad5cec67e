'use client';
import Link from 'next/link';
import { useState } from 'react';
import useSWRInfinite from 'swr/infinite';
import { Button } from '@/components/ui/button';
import { EmptyState } from '@/components/ui/empty-state';
import { Notice } from '@/components/ui/notice';
import { fetcher } from '@/lib/http/client';
import type { FiledView, TrayPage } from '@/lib/instruments/tray-schema';
import { TrayCard } from './tray-card';

type TrayListProps = { first: TrayPage; codes: readonly string[] };

const address = '/api/v1/tray?limit=20';
const codesId = 'fraction-codes';

/** Where a file went, with what could not be read in it. */
function FiledNotice({ filed }: { filed: FiledView }) {
  const code = filed.evidence.fraction ?? '';
  return (
    <Notice
      kind={filed.notes ? 'needs you' : 'info'}
      title={`${filed.evidence.fileName} now belongs to ${code}`}
      live
    >
      {filed.notes?.map((note) => (
        <p key={note}>{note}</p>
      ))}
      <Link
        className="link inline-flex min-h-target items-center"
        href={`/fractions/${encodeURIComponent(code)}`}
      >
        Open {code}
      </Link>
    </Notice>
  );
}

/** The files that wait, the newest first, each with a field for its fraction. */
export function TrayList({ first, codes }: TrayListProps) {
  const [filed, setFiled] = useState<FiledView | null>(null);
  const { data, error, size, setSize, isValidating, mutate } = useSWRInfinite<TrayPage>(
    (index: number, before: TrayPage | null) => {
      if (index === 0) return address;
      return before?.nextCursor ? `${address}&cursor=${encodeURIComponent(before.nextCursor)}` : null;
    },
    fetcher,
    { fallbackData: [first], revalidateOnMount: false },
  );
  const pages = data ?? [first];
  const items = pages.flatMap((page) => page.items);
  return (
    <div className="flex flex-col gap-4">
      {filed ? <FiledNotice key={filed.id} filed={filed} /> : null}
      {error ? (
        <Notice kind="fails" title="The tray could not be read" live>
          {(error as Error).message}
        </Notice>
      ) : null}
      <datalist id={codesId}>
        {codes.map((code) => (
          <option key={code} value={code} />
        ))}
      </datalist>
      {items.length === 0 ? (
        <EmptyState title="The tray is empty.">
          Files that an instrument sends without a fraction, or for one that is not known, wait here until
          somebody says where they belong.
        </EmptyState>
      ) : (
        <ul className="flex flex-col gap-4">
          {items.map((item) => (
            <TrayCard
              key={item.id}
              item={item}
              codesId={codesId}
              onFiled={(answer) => {
                setFiled(answer);
                void mutate();
              }}
            />
          ))}
        </ul>
      )}
      {pages.at(-1)?.nextCursor ? (
        <Button busy={isValidating} className="self-center" onClick={() => void setSize(size + 1)}>
          Show more
        </Button>
      ) : null}
    </div>
  );
}
