type ProgressProps = {
  /** What is going on: "Sending plate-uv254.jpg". */
  label: string;
  /** 0 to 1; null while the end is not known. */
  share: number | null;
  /** "3.2 of 8.0 MB" or the like. */
  detail?: string;
};

/** How far something slow has come, in a bar and in words. */
export function Progress({ label, share, detail }: ProgressProps) {
  const percent = share === null ? null : Math.round(Math.min(1, Math.max(0, share)) * 100);
  return (
    <div className="flex flex-col gap-1">
      <div className="flex justify-between gap-4 text-sm">
        <span className="min-w-0 truncate">{label}</span>
        <span className="shrink-0 text-ink-soft">
          {detail ?? (percent === null ? 'working …' : `${percent} %`)}
        </span>
      </div>
      <div
        role="progressbar"
        aria-label={label}
        aria-valuemin={0}
        aria-valuemax={100}
        aria-valuenow={percent ?? undefined}
        className="h-2 overflow-hidden rounded-full border border-line-strong bg-paper-sunk"
      >
        <div
          className={`h-full bg-glass ${percent === null ? 'animate-drip w-1/4' : 'transition-[width]'}`}
          style={percent === null ? undefined : { width: `${percent}%` }}
        />
      </div>
    </div>
  );
}
