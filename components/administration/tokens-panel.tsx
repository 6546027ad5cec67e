'use client';
import { useState } from 'react';
import { Checkbox } from '@/components/ui/checkbox';
import { DataTable } from '@/components/ui/data-table';
import { Field } from '@/components/ui/field';
import { NumberField } from '@/components/ui/number-field';
import { Select } from '@/components/ui/select';
import { api } from '@/lib/http/client';
import { type PresentedInstrument, type PresentedToken, scopes } from '@/lib/instruments/schema';
import { FormDialog } from './form-dialog';
import { RevokeToken } from './revoke-token';
import { SecretNotice } from './secret-notice';
import { useList } from './use-list';

const scopeWords = {
  'evidence:write': 'Send evidence files',
  'readings:write': 'Send log and refractometer readings',
};

function date(iso: string | null): string {
  return iso ? iso.slice(0, 10) : 'never';
}

export function TokensPanel() {
  const tokens = useList<PresentedToken>('/api/v1/admin/tokens');
  const instruments = useList<PresentedInstrument>('/api/v1/admin/instruments');
  const [secret, setSecret] = useState<{ name: string; token: string } | null>(null);
  async function create(form: FormData) {
    const name = String(form.get('name'));
    const json = {
      instrument: String(form.get('instrument')),
      name,
      scopes: scopes.filter((scope) => form.get(scope) === 'on'),
      expiresInDays: Number(form.get('expiresInDays')),
    };
    const { token } = await api<{ token: string }>('/api/v1/admin/tokens', { json });
    setSecret({ name, token });
    await tokens.refresh();
  }
  return (
    <section aria-labelledby="tokens">
      <div className="mb-3 flex flex-wrap items-center justify-between gap-3">
        <h2 id="tokens" className="text-lg">
          Access tokens
        </h2>
        <FormDialog title="Make a token" confirmLabel="Make it" onSend={create}>
          {(errors) => (
            <>
              <Select
                label="Instrument"
                name="instrument"
                required
                placeholder="Choose"
                options={instruments.items.map((i) => ({ value: i.id, label: `${i.name} (${i.groupName})` }))}
                error={errors.instrument}
              />
              <Field
                label="Used by"
                name="name"
                hint="Such as: PC beside the instrument."
                required
                error={errors.name}
              />
              <fieldset>
                <legend className="font-bold">Rights</legend>
                {scopes.map((scope) => (
                  <Checkbox
                    key={scope}
                    label={scopeWords[scope]}
                    name={scope}
                    defaultChecked={scope === 'evidence:write'}
                    error={errors.scopes}
                  />
                ))}
              </fieldset>
              <NumberField
                label="Ends after"
                unit="days"
                name="expiresInDays"
                defaultValue="365"
                error={errors.expiresInDays}
              />
            </>
          )}
        </FormDialog>
      </div>
      {secret ? (
        <SecretNotice
          title={`Token for ${secret.name}`}
          secret={secret.token}
          onClose={() => setSecret(null)}
        >
          It is shown once. Put it into the settings of the instrument PC now.
        </SecretNotice>
      ) : null}
      <DataTable
        caption="Access tokens"
        captionHidden
        rows={tokens.items}
        rowKey={(token) => token.id}
        empty={
          <p>
            {tokens.loading
              ? 'Fetching the tokens.'
              : 'No token yet. An instrument PC needs one to send files.'}
          </p>
        }
        columns={[
          { key: 'name', header: 'Used by', rowHeader: true, cell: (token) => token.name },
          { key: 'instrument', header: 'Instrument', cell: (token) => token.instrumentName },
          {
            key: 'hint',
            header: 'Ends with',
            cell: (token) => <span className="font-mono">{token.hint}</span>,
          },
          { key: 'scopes', header: 'Rights', cell: (token) => token.scopes.join(', ') },
          { key: 'seen', header: 'Last seen', cell: (token) => date(token.lastSeenAt) },
          { key: 'expires', header: 'Ends', cell: (token) => date(token.expiresAt) },
          {
            key: 'revoke',
            header: 'Revoke',
            cell: (token) => <RevokeToken token={token} onRevoked={() => void tokens.refresh()} />,
          },
        ]}
      />
    </section>
  );
}
