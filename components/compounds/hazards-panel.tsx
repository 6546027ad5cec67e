import { DefinitionList } from '@/components/ui/definition-list';
import { Notice } from '@/components/ui/notice';
import type { CompoundJson } from '@/lib/compounds/schema';

/** Cautions that follow from the record. A caution is never a permission, and an empty record is no all-clear. */
export function HazardsPanel({ hazards }: { hazards: CompoundJson['hazards'] }) {
  const { peroxide, flashPointC, autoignitionTemperatureC } = hazards;
  return (
    <div className="flex flex-col gap-3">
      {peroxide ? (
        <Notice kind="needs you" title={`Peroxide class ${peroxide.peroxideClass}: ${peroxide.word}`}>
          <p>{peroxide.advice}</p>
          <p className="mt-1 text-xs text-ink-soft">{peroxide.source}</p>
        </Notice>
      ) : (
        <p className="text-ink-soft">No peroxide class is recorded. That does not say that it forms none.</p>
      )}
      <DefinitionList
        items={[
          {
            term: 'Flash point',
            value: flashPointC ? minus(flashPointC.value) : null,
            unit: '°C',
            source: flashPointC?.source,
          },
          {
            term: 'Autoignition temperature',
            value: autoignitionTemperatureC ? minus(autoignitionTemperatureC.value) : null,
            unit: '°C',
            source: autoignitionTemperatureC?.source,
          },
        ]}
      />
      <p className="text-sm text-ink-soft">
        Keep bath and hot plate well below the autoignition temperature, vent the still, and follow local
        rules and the judgement of trained staff.
      </p>
    </div>
  );
}

function minus(value: number): string {
  return String(value).replace('-', '\u2212');
}
