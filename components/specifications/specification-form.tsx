'use client';

import { useRouter } from 'next/navigation';
import { type FormEvent, useState } from 'react';
import { Button } from '@/components/ui/button';
import { Checkbox } from '@/components/ui/checkbox';
import { Field } from '@/components/ui/field';
import { Notice } from '@/components/ui/notice';
import { Select } from '@/components/ui/select';
import { Textarea } from '@/components/ui/textarea';
import { sayDone } from '@/components/ui/toaster';
import { api, ApiError } from '@/lib/http/client';
import { LimitFields } from './limit-fields';
import { noLimits, readLimits } from './read-limits';

type SpecificationFormProps = {
  compoundId: string;
  /** Groups where the reader is PI. */
  groups: { id: string; name: string }[];
  /** Why the reader may not write one; the form's button then says so. */
  whyNot: string | null;
};

/** Writes a new edition of a specification; what was typed stays when the server says no. */
export function SpecificationForm({ compoundId, groups, whyNot }: SpecificationFormProps) {
  const router = useRouter();
  const [grade, setGrade] = useState('working grade');
  const [rule, setRule] = useState('guarded');
  const [group, setGroup] = useState(groups[0]?.id ?? '');
  const [limits, setLimits] = useState(noLimits);
  const [note, setNote] = useState('');
  const [approve, setApprove] = useState(true);
  const [busy, setBusy] = useState(false);
  const [errors, setErrors] = useState<Record<string, string>>({});
  const [problem, setProblem] = useState<string | null>(null);

  async function write(event: FormEvent) {
    event.preventDefault();
    const read = readLimits(limits);
    setErrors(read.errors);
    setProblem(null);
    if (Object.keys(read.errors).length > 0) return;
    setBusy(true);
    try {
      const json = {
        grade,
        decisionRule: rule,
        criteria: read.criteria,
        approve,
        ...(note.trim() && { note }),
        ...(group && { group }),
      };
      await api(`/api/v1/compounds/${compoundId}/specifications`, { json });
      sayDone(approve ? 'Edition written and in force' : 'Edition written; it waits for approval');
      setLimits(noLimits);
      setNote('');
      router.refresh();
    } catch (error) {
      if (error instanceof ApiError)
        setErrors(Object.fromEntries(error.errors.map((one) => [one.path, one.message])));
      setProblem(error instanceof ApiError ? error.detail : 'That did not work. Try again.');
    } finally {
      setBusy(false);
    }
  }
  return (
    <form onSubmit={write} noValidate className="flex max-w-prose flex-col gap-4">
      <div className="grid gap-4 sm:grid-cols-2">
        <Field
          label="Grade"
          hint="What the limits are for."
          value={grade}
          error={errors.grade ?? null}
          onChange={(event) => setGrade(event.target.value)}
        />
        <Select
          label="How to decide"
          value={rule}
          onChange={(event) => setRule(event.target.value)}
          options={[
            { value: 'guarded', label: 'guarded: the uncertainty counts against it' },
            { value: 'simple', label: 'simple: the number alone' },
          ]}
        />
        {groups.length > 1 ? (
          <Select
            label="Group"
            value={group}
            onChange={(event) => setGroup(event.target.value)}
            options={groups.map(({ id, name }) => ({ value: id, label: name }))}
          />
        ) : null}
      </div>
      <LimitFields limits={limits} errors={errors} onChange={setLimits} />
      <Textarea
        label="Note"
        optional
        value={note}
        maxLength={1000}
        onChange={(event) => setNote(event.target.value)}
      />
      <Checkbox
        label="Approve it now"
        hint="It is then in force, and open fractions of the group are judged by it. Submitted ones keep theirs."
        checked={approve}
        onChange={(event) => setApprove(event.target.checked)}
      />
      {problem ? (
        <Notice kind="fails" title="Not written" live>
          {problem}
        </Notice>
      ) : null}
      <div>
        <Button type="submit" variant="primary" busy={busy} disabledReason={whyNot}>
          Write edition
        </Button>
      </div>
    </form>
  );
}
