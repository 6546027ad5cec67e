import { drawStructureSvg } from '@/lib/compounds/structure';

type StructureDrawingProps = {
  smiles: string | null;
  name: string;
  width: number;
  height: number;
  enlarged?: number;
};

/**
 * The drawn structure, in the colour of the text, `enlarged` times the size it was drawn for (a small drawing has short
 * bonds and large letters). What the writer gives is numbers and known shapes only.
 */
export async function StructureDrawing({ smiles, name, width, height, enlarged = 1 }: StructureDrawingProps) {
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
      className="w-full [&>svg]:block [&>svg]:h-auto [&>svg]:w-full"
      style={{ maxWidth: width * enlarged }}
      dangerouslySetInnerHTML={{ __html: svg }}
    />
  );
}
