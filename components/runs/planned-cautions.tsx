'use client';
import useSWR from 'swr';
import type { CautionsJson } from '@/lib/distillation/caution-schema';
import { fetcher } from '@/lib/http/client';
import { CautionsList } from './cautions-list';

type PlannedCautionsProps = {
  compoundIds: readonly string[];
  heatingTemperatureC: number | null;
  pressureMbar: number | null;
};

/** The cautions for a still while it is being planned; they follow what is chosen in the form. */
export function PlannedCautions({ compoundIds, heatingTemperatureC, pressureMbar }: PlannedCautionsProps) {
  const query = new URLSearchParams({ compounds: compoundIds.join(',') });
  if (heatingTemperatureC !== null) query.set('heatingTemperatureC', String(heatingTemperatureC));
  if (pressureMbar !== null) query.set('pressureMbar', String(pressureMbar));
  const { data } = useSWR(
    compoundIds.length > 0 ? `/api/v1/runs/cautions?${query}` : null,
    fetcher<CautionsJson>,
    {
      keepPreviousData: true,
    },
  );
  if (!data) return <p className="text-ink-soft">Choose the target to see the usual cautions for it.</p>;
  return <CautionsList cautions={data.cautions} />;
}
