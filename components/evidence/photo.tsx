import type { EvidenceView } from '@/lib/evidence/schema';

type PhotoProps = {
  evidence: Pick<EvidenceView, 'id' | 'fileName' | 'widthPx' | 'heightPx'>;
  /** What it shows, for those who do not see it. */
  alt?: string;
  /** Width on the page, for the browser to choose from: a CSS length. */
  sizes?: string;
  className?: string;
};

export const previewPath = (id: string, width: number) => `/api/v1/evidence/${id}/preview?width=${width}`;

/** A photo as its preview: upright, without metadata, in the smallest size that is sharp. */
export function Photo({ evidence, alt, sizes = '16rem', className = '' }: PhotoProps) {
  return (
    // Not next/image: its optimiser would keep copies of what only members may see.
    // eslint-disable-next-line @next/next/no-img-element
    <img
      src={previewPath(evidence.id, 512)}
      srcSet={[256, 512, 1024, 2048]
        .map((width) => `${previewPath(evidence.id, width)} ${width}w`)
        .join(', ')}
      sizes={sizes}
      width={evidence.widthPx ?? undefined}
      height={evidence.heightPx ?? undefined}
      alt={alt ?? `Photo ${evidence.fileName}`}
      loading="lazy"
      decoding="async"
      className={className}
    />
  );
}
