import { drawStructureSvg } from '@/lib/compounds/structure';

type StructureDrawingProps = { smiles: string | null; name: string; width: number; height: number };

/** The drawn structure, in the colour of the text. What the writer gives is numbers and known shapes only. */
export async function StructureDrawing({ smiles, name, width, height }: StructureDrawingProps) {
  const title = `Structure of ${name}`;
  const svg =
    smiles === null ? null : await drawStructureSvg(smiles, { width, height, title }).catch(() => null);
  if (svg === null)
    return (
      <p
        className="flex items-center justify-center rounded border border-dashed border-line text-center text-sm text-ink-soft"
        style={{ width, height, maxWidth: '100%' }}
      >
        {smiles === null ? 'no structure recorded' : 'structure cannot be drawn'}
      </p>
    );
  return (
    <div
      className="[&>svg]:block [&>svg]:h-auto [&>svg]:max-w-full"
      style={{ maxWidth: width }}
      dangerouslySetInnerHTML={{ __html: svg }}
    />
  );
}
