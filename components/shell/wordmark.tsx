/** The sign of the product: a cut strip with its heart cut filled, and the curve that rises over it. */
export function StripSign({ size = 28 }: { size?: number }) {
  return (
    <svg width={size} height={size} viewBox="0 0 32 32" aria-hidden="true" className="shrink-0">
      <path
        d="M2.5 11.5h3.8c2.2 0 1.4-5 3.7-5h12c2.3 0 1.5-4 3.7-4h3.8"
        fill="none"
        stroke="currentColor"
        strokeWidth="2"
        strokeLinecap="round"
      />
      <path
        d="M2.5 16.5h27v11h-27ZM9.5 16.5v11M22.5 16.5v11"
        fill="none"
        stroke="currentColor"
        strokeWidth="2"
        strokeLinejoin="round"
      />
      <path d="M9.5 15.5h13v13h-13Z" fill="var(--glass)" />
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
