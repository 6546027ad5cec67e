import type { Ghost } from './ghosts';

/** Spots that other photos of the plate show, hollow and dashed, where they lie in this one. */
export function GhostSpots({ ghosts, unit }: { ghosts: readonly Ghost[]; unit: number }) {
  return (
    <g aria-hidden="true" pointerEvents="none" data-part="ghosts">
      {ghosts.map(({ key, x, y }) => (
        <g key={key} transform={`translate(${x} ${y}) scale(${unit})`} fill="none">
          <path d="M0-12 12 0 0 12-12 0Z" stroke="#fff" strokeWidth="4" strokeOpacity="0.9" />
          <path d="M0-12 12 0 0 12-12 0Z" stroke="#1c1a16" strokeWidth="1.5" strokeDasharray="2 2.5" />
        </g>
      ))}
    </g>
  );
}
