'use client';
import { useState } from 'react';
import { Photo } from '@/components/evidence/photo';
import { Button } from '@/components/ui/button';
import { Field } from '@/components/ui/field';
import { api, ApiError } from '@/lib/http/client';
import { isPhotoType, kindFacts, sizeText } from '@/lib/evidence/kinds';
import type { FiledView, TrayItemView } from '@/lib/instruments/tray-schema';

type TrayCardProps = {
  item: TrayItemView;
  /** The id of the datalist with codes to choose from. */
  codesId: string;
  onFiled: (filed: FiledView) => void;
};

/** One waiting file: what it is, who sent it and why it waits, and the field that gives it its fraction. */
export function TrayCard({ item, codesId, onFiled }: TrayCardProps) {
  const { evidence } = item;
  const [code, setCode] = useState('');
  const [busy, setBusy] = useState(false);
  const [error, setError] = useState<string | null>(null);
  async function fileIt() {
    setBusy(true);
    setError(null);
    try {
      onFiled(await api<FiledView>(`/api/v1/tray/${item.id}/file`, { json: { fraction: code.trim() } }));
    } catch (caught) {
      if (!(caught instanceof ApiError)) throw caught;
      setError(caught.detail);
    } finally {
      setBusy(false);
    }
  }
  return (
    <li className="flex flex-wrap gap-x-6 gap-y-4 rounded border border-line bg-paper-raised p-4">
      {isPhotoType(evidence.mediaType) ? (
        <a
          href={item.links.content}
          className="block"
          aria-label={`Open the original of ${evidence.fileName}`}
        >
          <Photo
            evidence={evidence}
            sizes="10rem"
            className="h-40 w-32 rounded-sm bg-paper-sunk object-contain"
          />
        </a>
      ) : null}
      <div className="min-w-0 flex-1 basis-56">
        <h2 className="text-lg break-all">{evidence.fileName}</h2>
        <p>{item.reason}</p>
        <p className="text-sm text-ink-soft">
          {kindFacts[evidence.kind].word}, {sizeText(evidence.sizeBytes)}
        </p>
        <p className="text-sm text-ink-soft">
          from {item.instrument ?? evidence.sentBy.name}, {item.receivedAt.slice(0, 10)}{' '}
          {item.receivedAt.slice(11, 16)} UTC
        </p>
        <a className="link inline-flex min-h-target items-center" href={item.links.content}>
          Open the original
        </a>
      </div>
      <form
        className="flex min-w-0 flex-1 basis-64 flex-col gap-3"
        onSubmit={(event) => {
          event.preventDefault();
          void fileIt();
        }}
      >
        <Field
          label="Belongs to fraction"
          hint="Its code, as on the label of the receiver."
          list={codesId}
          value={code}
          error={error}
          autoComplete="off"
          spellCheck={false}
          onChange={(event) => setCode(event.target.value)}
        />
        <Button
          type="submit"
          busy={busy}
          className="self-start"
          disabledReason={code.trim() === '' ? 'Enter the code of a fraction first.' : null}
        >
          Give it to the fraction
        </Button>
      </form>
    </li>
  );
}
