import type { FractionLabel } from '@/lib/distillation/fraction-labels';

/** One printable label, 70 mm x 36 mm: black on white in every theme, since it goes on paper. */
export function FractionLabelView({ label }: { label: FractionLabel }) {
  return (
    <article
      aria-label={`Label of ${label.code}`}
      className="flex h-[36mm] w-[70mm] items-center gap-[2mm] overflow-hidden rounded-sm border border-line-strong bg-[#fff] p-[2mm] text-[#000] print:break-inside-avoid"
    >
      <div
        role="img"
        aria-label={`QR code that opens ${label.url}`}
        className="size-[31mm] shrink-0 [&_svg]:size-full"
        // Drawn by our own server from the address alone.
        dangerouslySetInnerHTML={{ __html: label.qrSvg }}
      />
      <div className="flex min-w-0 flex-1 flex-col gap-[0.8mm] text-[8pt] leading-tight">
        <p className="text-[11pt] font-bold break-words">{label.code}</p>
        <p className="line-clamp-2 font-bold">{label.compound}</p>
        <p>
          {label.cut}
          {label.netMass ? `, ${label.netMass}` : ''}
        </p>
        {label.head ? <p>{label.head}</p> : null}
        <p>{label.collected}</p>
        {label.storagePlace ? <p className="truncate">{label.storagePlace}</p> : null}
      </div>
    </article>
  );
}
