import { DefinitionList } from '@/components/ui/definition-list';
import type { FractionSheet } from '@/lib/acceptance/fraction-sheet-schema';

type Facts = Pick<
  FractionSheet,
  | 'netMassG'
  | 'tareMassG'
  | 'grossMassG'
  | 'appearance'
  | 'storagePlace'
  | 'purityPercent'
  | 'collectedBy'
  | 'collectedAt'
>;

/** Masses, look, place and who collected it. */
export function SheetFacts({ sheet }: { sheet: Facts }) {
  const grams = (value: number | null) => value?.toFixed(3) ?? null;
  return (
    <DefinitionList
      columns={2}
      items={[
        {
          term: 'Purity',
          value: sheet.purityPercent?.toFixed(2) ?? null,
          unit: 'area %',
          condition: sheet.purityPercent === null ? null : 'by GC, equal response assumed',
        },
        {
          term: 'Net mass',
          value: grams(sheet.netMassG),
          unit: 'g',
          condition:
            sheet.netMassG === null
              ? null
              : `gross ${grams(sheet.grossMassG)} − tare ${grams(sheet.tareMassG)} g`,
        },
        { term: 'Appearance', value: sheet.appearance },
        { term: 'Stored', value: sheet.storagePlace },
        { term: 'Collected by', value: sheet.collectedBy.name },
        { term: 'Collected', value: `${sheet.collectedAt.slice(0, 16).replace('T', ' ')} UTC` },
      ]}
    />
  );
}
