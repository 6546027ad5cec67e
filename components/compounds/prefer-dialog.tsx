'use client';
import { useRouter } from 'next/navigation';
import { Textarea } from '@/components/ui/textarea';
import { sayDone } from '@/components/ui/toaster';
import type { LiteratureValueJson } from '@/lib/compounds/schema';
import { api } from '@/lib/http/client';
import { FormSheet } from './form-sheet';
import { textOf } from './read-form';

type PreferDialogProps = { compoundId: string; value: LiteratureValueJson; disabledReason: string | null };

/** Makes a value the one that measurements are compared with. */
export function PreferDialog({ compoundId, value, disabledReason }: PreferDialogProps) {
  const router = useRouter();
  async function send(form: FormData) {
    await api(`/api/v1/compounds/${compoundId}/literature/${value.id}`, {
      method: 'PATCH',
      version: value.version,
      json: { preferred: true, reason: textOf(form, 'reason') ?? '' },
    });
    sayDone('This value is preferred now');
    router.refresh();
  }
  return (
    <FormSheet
      button="Prefer"
      variant="quiet"
      disabledReason={disabledReason}
      title={`Prefer this ${value.property}`}
      description="Measurements are compared with the preferred value from now on. Signed fractions keep the value they were judged by."
      confirm="Prefer this value"
      onSend={send}
    >
      {(errors) => <Textarea label="Why" name="reason" required error={errors.reason} />}
    </FormSheet>
  );
}
