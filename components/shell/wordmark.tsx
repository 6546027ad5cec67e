/** The sign of the product: a cut strip with its heart cut filled, and the curve that rises over it. */
export function StripSign({ size = 28 }: { size?: number }) {
  return (
    <svg width={size} height={size} viewBox="0 0 32 32" aria-hidden="true" className="shrink-0">
      <path
        d="M2.5 14.5c3.5-.4 4.5-8.5 8-8.7h10.5c3.5-.2 4-2.8 8.5-3"
        fill="none"
        stroke="currentColor"
        strokeWidth="2"
        strokeLinecap="round"
      />
      <path
        d="M2.5 18.5h27v9h-27Z"
        fill="none"
        stroke="currentColor"
        strokeWidth="2"
        strokeLinejoin="round"
      />
      <path d="M10.5 17.5h11v11h-11Z" fill="var(--glass)" />
    </svg>
  );
}

/** Sign and name. */
export function Wordmark({ size = 28 }: { size?: number }) {
  return (
    <span className="inline-flex items-center gap-2.5 text-ink">
      <StripSign size={size} />
      <span className="text-lg font-black tracking-tight">Heartcut</span>
    </span>
  );
}
