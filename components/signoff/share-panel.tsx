'use client';

import { useState } from 'react';
import useSWR from 'swr';
import { Button } from '@/components/ui/button';
import { ConfirmDialog } from '@/components/ui/confirm-dialog';
import { CopyButton } from '@/components/ui/copy-button';
import { DataTable } from '@/components/ui/data-table';
import { Field } from '@/components/ui/field';
import { Notice } from '@/components/ui/notice';
import { NumberField } from '@/components/ui/number-field';
import { api, ApiError, fetcher } from '@/lib/http/client';
import type { ShareJson } from '@/lib/signoff/share-schema';

const day = (iso: string) => iso.slice(0, 10);

/** Read-only links of a fraction: make one, see which there are, end one. */
export function SharePanel({ code, whyNot }: { code: string; whyNot: string | null }) {
  const path = `/api/v1/fractions/${encodeURIComponent(code)}/shares`;
  const { data, mutate } = useSWR<{ items: ShareJson[] }>(path, fetcher);
  const [recipient, setRecipient] = useState('');
  const [days, setDays] = useState('30');
  const [made, setMade] = useState<string | null>(null);
  const [error, setError] = useState<string | null>(null);
  const [ending, setEnding] = useState<ShareJson | null>(null);

  async function attempt(work: () => Promise<void>) {
    setError(null);
    try {
      await work();
      await mutate();
    } catch (problem) {
      setError(problem instanceof ApiError ? problem.detail : 'That did not work. Try again.');
    }
  }
  const make = () =>
    attempt(async () => {
      const body = {
        expiresInDays: Number(days),
        ...(recipient.trim() ? { recipient: recipient.trim() } : {}),
      };
      const answer = await api<ShareJson & { url: string }>(path, { json: body });
      setMade(answer.url);
      setRecipient('');
    });
  return (
    <div className="flex flex-col gap-3">
      <div className="grid gap-3 sm:grid-cols-[1fr_9rem_auto] sm:items-end">
        <Field
          label="For whom"
          optional
          value={recipient}
          onChange={(event) => setRecipient(event.target.value)}
        />
        <NumberField
          label="Lives for"
          unit="days"
          value={days}
          onChange={(event) => setDays(event.target.value)}
        />
        <Button disabledReason={whyNot} onClick={make}>
          Make a link
        </Button>
      </div>
      {error ? (
        <Notice kind="fails" live>
          {error}
        </Notice>
      ) : null}
      {made ? (
        <Notice title="The link, shown this once" live action={<CopyButton text={made} />}>
          <span className="font-mono break-all">{made}</span>
        </Notice>
      ) : null}
      {data && data.items.length > 0 ? (
        <DataTable
          caption="Links of this fraction"
          columns={[
            {
              key: 'for',
              header: 'For',
              rowHeader: true,
              cell: (share: ShareJson) => share.recipient ?? 'not named',
            },
            { key: 'by', header: 'Made by', cell: (share) => share.madeBy },
            {
              key: 'until',
              header: 'Until',
              cell: (share) => (share.revokedAt ? `revoked ${day(share.revokedAt)}` : day(share.expiresAt)),
            },
            {
              key: 'end',
              header: 'End',
              cell: (share) =>
                share.revokedAt ? '' : <Button onClick={() => setEnding(share)}>Revoke</Button>,
            },
          ]}
          rows={data.items}
          rowKey={(share) => share.id}
        />
      ) : null}
      <ConfirmDialog
        open={ending !== null}
        onOpenChange={() => setEnding(null)}
        question={`Revoke the link for ${ending?.recipient ?? 'nobody named'}?`}
        goes="The link, at once: whoever opens it reads that it no longer works."
        stays="The fraction, its evidence and its signatures."
        confirmLabel="Revoke"
        onConfirm={() =>
          attempt(async () => {
            await api(`${path}?id=${ending?.id}`, { method: 'DELETE' });
            setEnding(null);
          })
        }
      />
    </div>
  );
}
