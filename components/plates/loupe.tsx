import type { Point } from './marks';

/** The part of the photo that is in sight, px of the photo. */
export type Sight = { left: number; top: number; right: number; bottom: number };

type LoupeProps = {
  /** The place in the photo that is enlarged, px of the photo. */
  at: Point;
  sight: Sight;
  href: string;
  extent: { width: number; height: number };
  unit: number;
};

const radius = 52;
/** From the place to the middle of the loupe, px of the screen: the finger and the place stay free. */
const away = 108;
const times = 2.5;

/** Above the place; beside it where there is no room above. */
export function loupePlace(at: Point, sight: Sight, unit: number): Point {
  const [far, half] = [away * unit, radius * unit];
  if (at.y - far - half >= sight.top)
    return { x: Math.min(sight.right - half, Math.max(sight.left + half, at.x)), y: at.y - far };
  const y = Math.max(sight.top + half, at.y - half);
  return { x: at.x - far - half >= sight.left ? at.x - far : at.x + far, y };
}

/** The photo under the finger, enlarged beside it, with a cross where the mark lies. */
export function Loupe({ at, sight, href, extent, unit }: LoupeProps) {
  const place = loupePlace(at, sight, unit);
  return (
    <g
      aria-hidden="true"
      pointerEvents="none"
      data-part="loupe"
      transform={`translate(${place.x} ${place.y})`}
    >
      <clipPath id="loupe-glass">
        <circle r={radius * unit} />
      </clipPath>
      <circle r={(radius + 3) * unit} fill="#1c1a16" />
      <circle r={(radius + 1.5) * unit} fill="#fff" />
      <g clipPath="url(#loupe-glass)">
        <image
          href={href}
          width={extent.width}
          height={extent.height}
          preserveAspectRatio="none"
          transform={`scale(${times}) translate(${-at.x} ${-at.y})`}
        />
        {(['#fff', '#1c1a16'] as const).map((stroke, index) => (
          <path
            key={stroke}
            transform={`scale(${unit})`}
            d="M-40 0H-6M6 0H40M0-40V-6M0 6V40"
            stroke={stroke}
            strokeWidth={index === 0 ? 4 : 1.5}
          />
        ))}
      </g>
    </g>
  );
}
