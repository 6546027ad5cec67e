import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';

const css = readFileSync(new URL('../../app/globals.css', import.meta.url), 'utf8');
const tokens = new Map(
  [...css.matchAll(/--([a-z-]+):\s*light-dark\((#[0-9a-f]{6}),\s*(#[0-9a-f]{6})\)/g)].map((m) => [
    m[1]!,
    { light: m[2]!, dark: m[3]! },
  ]),
);

/** Relative luminance of an sRGB colour. Source: WCAG 2.2, definition of "relative luminance". */
function relativeLuminance(hex: string): number {
  const [r, g, b] = [1, 3, 5].map((at) => {
    const channel = parseInt(hex.slice(at, at + 2), 16) / 255;
    return channel <= 0.04045 ? channel / 12.92 : ((channel + 0.055) / 1.055) ** 2.4;
  }) as [number, number, number];
  return 0.2126 * r + 0.7152 * g + 0.0722 * b;
}

/** Contrast ratio of two colours. Source: WCAG 2.2, definition of "contrast ratio". */
function contrastRatio(one: string, other: string): number {
  const [low, high] = [relativeLuminance(one), relativeLuminance(other)].sort((a, b) => a - b) as [
    number,
    number,
  ];
  return (high + 0.05) / (low + 0.05);
}

const grounds = ['paper', 'paper-raised', 'paper-sunk'];
/** Text on its ground: 4.5 (WCAG 2.2, 1.4.3). */
const textPairs = [
  ...['ink', 'ink-soft', 'glass', 'glass-strong', 'needs', 'fails', 'fails-strong'].flatMap((text) =>
    grounds.map((ground) => [text, ground] as const),
  ),
  ...['glass', 'needs', 'fails'].flatMap((tone) => [
    [tone, `${tone}-wash`] as const,
    ['ink', `${tone}-wash`] as const,
  ]),
  ['ink-soft', 'glass-wash'],
  ['ink-soft', 'needs-wash'],
  ['ink-soft', 'fails-wash'],
  ['glass-strong', 'glass-wash'],
  ['glass-on', 'glass'],
  ['glass-on', 'glass-strong'],
  ['fails-on', 'fails'],
  ['fails-on', 'fails-strong'],
] as const;
/** Edges of controls, marks and the focus ring: 3 (WCAG 2.2, 1.4.11). */
const edgePairs = [
  ...grounds.map((ground) => ['line-strong', ground] as const),
  ...grounds.map((ground) => ['glass', ground] as const),
];

function ratioOf(one: string, other: string, theme: 'light' | 'dark'): number {
  const [a, b] = [tokens.get(one), tokens.get(other)];
  if (!a || !b) throw new Error(`app/globals.css has no token ${a ? other : one}`);
  return contrastRatio(a[theme], b[theme]);
}

describe('contrast', () => {
  it('is 21 for black on white and 1 for a colour on itself (WCAG 2.2)', () => {
    expect(contrastRatio('#000000', '#ffffff')).toBeCloseTo(21, 5);
    expect(contrastRatio('#0e6a68', '#0e6a68')).toBe(1);
  });

  it.each(['light', 'dark'] as const)('of text reaches 4.5 on each ground in the %s theme', (theme) => {
    const low = textPairs.filter(([text, ground]) => ratioOf(text, ground, theme) < 4.5);
    expect(low.map(([t, g]) => `${t} on ${g}: ${ratioOf(t, g, theme).toFixed(2)}`)).toEqual([]);
  });

  it.each(['light', 'dark'] as const)('of edges reaches 3 on each ground in the %s theme', (theme) => {
    const low = edgePairs.filter(([edge, ground]) => ratioOf(edge, ground, theme) < 3);
    expect(low.map(([e, g]) => `${e} on ${g}: ${ratioOf(e, g, theme).toFixed(2)}`)).toEqual([]);
  });
});
