import { CopyButton } from '@/components/ui/copy-button';
import { DefinitionList } from '@/components/ui/definition-list';
import type { CompoundJson } from '@/lib/compounds/schema';
import { FormulaText } from './formula-text';
import { StructureDrawing } from './structure-drawing';

/** The structure, and every way to name the compound. */
export function IdentityPanel({ compound }: { compound: CompoundJson }) {
  const { name, cas, formula, molarMassGMol, smiles, inchiKey, synonyms } = compound;
  return (
    <div className="flex flex-col gap-4">
      <div className="flex justify-center rounded-lg border border-line bg-paper-raised p-4">
        <StructureDrawing smiles={smiles} name={name} width={200} height={130} enlarged={1.7} />
      </div>
      <DefinitionList
        items={[
          { term: 'CAS number', value: cas },
          { term: 'Formula', value: formula ? <FormulaText formula={formula} /> : null },
          { term: 'Molar mass', value: molarMassGMol?.toFixed(3) ?? null, unit: 'g/mol' },
          { term: 'SMILES', value: smiles ? <Code text={smiles} /> : null },
          { term: 'InChIKey', value: inchiKey ? <Code text={inchiKey} /> : null },
          { term: 'Synonyms', value: synonyms.length > 0 ? synonyms.join(', ') : null },
        ]}
      />
      {smiles ? (
        <div>
          <CopyButton text={smiles} label="Copy SMILES" />
        </div>
      ) : null}
    </div>
  );
}

function Code({ text }: { text: string }) {
  return <code className="font-mono text-sm font-normal break-all">{text}</code>;
}
