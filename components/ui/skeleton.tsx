type SkeletonProps = {
  /** What is being fetched, read out once. */ label: string;
  lines?: number;
  className?: string;
};

/** Stands in for content that is on its way. */
export function Skeleton({ label, lines = 3, className = '' }: SkeletonProps) {
  return (
    <div role="status" className={`flex flex-col gap-3 ${className}`}>
      <span className="sr-only">{label}</span>
      {Array.from({ length: lines }, (_, at) => (
        <span
          key={at}
          aria-hidden="true"
          className={`animate-fade block h-4 rounded bg-line ${['w-full', 'w-11/12', 'w-4/5', 'w-2/3'][at % 4]}`}
        />
      ))}
    </div>
  );
}
