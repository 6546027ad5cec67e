import Link from 'next/link';
import type { CompoundRow } from '@/lib/compounds/schema';
import { FormulaText } from './formula-text';
import { StructureDrawing } from './structure-drawing';

/** A compound in the list: the drawing first, then what it is called by. The whole card leads to it. */
export function CompoundCard({ compound }: { compound: CompoundRow }) {
  const { id, name, cas, formula, smiles, peroxideClass, normalBoilingPointC: boils } = compound;
  return (
    <article className="relative flex h-full flex-col rounded-lg border border-line bg-paper-raised p-4 focus-within:border-glass hover:border-glass">
      <div className="flex h-28 items-center justify-center" aria-hidden="true">
        <StructureDrawing smiles={smiles} name={name} width={190} height={110} />
      </div>
      <h2 className="mt-2 text-lg break-words">
        <Link href={`/compounds/${id}`} className="after:absolute after:inset-0 hover:text-glass">
          {name}
        </Link>
      </h2>
      <dl className="mt-1 grid grid-cols-[auto_1fr] gap-x-3 text-sm">
        <Fact term="Formula">{formula ? <FormulaText formula={formula} /> : null}</Fact>
        <Fact term="CAS">{cas}</Fact>
        <Fact term="Boils at">{boils ? `${boils.value} °C (${boils.pressureKPa} kPa)` : null}</Fact>
        {peroxideClass ? <Fact term="Peroxides">class {peroxideClass}</Fact> : null}
      </dl>
    </article>
  );
}

function Fact({ term, children }: { term: string; children: React.ReactNode }) {
  return (
    <>
      <dt className="text-ink-soft">{term}</dt>
      <dd className="text-right">{children ?? <span className="text-ink-soft italic">not recorded</span>}</dd>
    </>
  );
}
