'use client';
import { Button } from '@/components/ui/button';
import { Field } from '@/components/ui/field';
import { NumberField } from '@/components/ui/number-field';

type Range = { fromMin: string; toMin: string; reason: string };
type ExcludedRangesProps = {
  ranges: readonly Range[];
  onChange: (ranges: Range[]) => void;
  problems: Record<string, string>;
};

/** Ranges that do not count, such as the solvent, each with its reason. */
export function ExcludedRanges({ ranges, onChange, problems }: ExcludedRangesProps) {
  const change = (at: number, part: Partial<Range>) =>
    onChange(ranges.map((range, k) => (k === at ? { ...range, ...part } : range)));
  return (
    <fieldset className="flex flex-col gap-3">
      <legend className="mb-1 font-bold">
        Ranges left out <span className="font-normal text-ink-soft">(optional)</span>
      </legend>
      {ranges.map((range, at) => (
        <div key={at} className="grid grid-cols-2 gap-3 rounded border border-line p-3">
          <NumberField
            label="From"
            unit="min"
            value={range.fromMin}
            onChange={(event) => change(at, { fromMin: event.target.value })}
            error={problems[`exclude.${at}.fromMin`]}
          />
          <NumberField
            label="To"
            unit="min"
            value={range.toMin}
            onChange={(event) => change(at, { toMin: event.target.value })}
            error={problems[`exclude.${at}.toMin`]}
          />
          <Field
            label="Why"
            className="col-span-2"
            value={range.reason}
            placeholder="solvent"
            onChange={(event) => change(at, { reason: event.target.value })}
            error={problems[`exclude.${at}.reason`]}
          />
          <div className="col-span-2">
            <Button variant="quiet" onClick={() => onChange(ranges.filter((_, k) => k !== at))}>
              Count this range again
            </Button>
          </div>
        </div>
      ))}
      <div>
        <Button onClick={() => onChange([...ranges, { fromMin: '', toMin: '', reason: '' }])}>
          Leave out a range
        </Button>
      </div>
    </fieldset>
  );
}
