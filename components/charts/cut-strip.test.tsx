import { renderToStaticMarkup } from 'react-dom/server';
import { describe, expect, it } from 'vitest';
import { CutStrip } from './cut-strip';
import type { CutStripSegment } from './cut-strip-types';

const fraction = (number: number, rest: Partial<CutStripSegment>): CutStripSegment => ({
  code: `D-2026-0001-F${number}`,
  number,
  cut: 'heart',
  netMassG: 20,
  headTemperatureFromC: 76.9,
  headTemperatureToC: 77.3,
  status: 'submitted',
  verdict: 'pass',
  evidence: { tlc: 'pass', gc: 'pass', refractiveIndex: 'pass', boilingRange: 'pass' },
  href: `/fractions/D-2026-0001-F${number}`,
  ...rest,
});

const segments = [
  fraction(1, { cut: 'fore-run', netMassG: 2, verdict: 'fail', status: 'signed_off' }),
  fraction(2, {}),
  fraction(3, {
    cut: 'residue',
    netMassG: null,
    headTemperatureFromC: null,
    headTemperatureToC: null,
    status: 'open',
    verdict: null,
    evidence: { tlc: 'missing', gc: 'missing', refractiveIndex: 'missing', boilingRange: 'missing' },
  }),
];
const markup = renderToStaticMarkup(
  <CutStrip
    segments={segments}
    current="D-2026-0001-F2"
    expectedBoilingPointC={77.1}
    title="Run D-2026-0001"
  />,
);
const picture = markup.slice(markup.indexOf('<svg'), markup.indexOf('<figcaption'));

describe('the cut strip', () => {
  it('leads to each fraction by a link that says in words all that the segment shows', () => {
    expect([...picture.matchAll(/href="([^"]+)"/g)].map((m) => m[1])).toEqual(segments.map((s) => s.href));
    expect(picture).toContain(
      '<title>1 fore-run, 2.00 g, head temperature 76.9 to 77.3 °C, signed off, verdict fail, ' +
        'Thin-layer chromatography pass, Gas chromatography pass, Refractive index pass, Boiling range pass</title>',
    );
  });

  it('says what is not known instead of drawing it as nothing', () => {
    expect(picture).toContain('3 residue, not weighed, head temperature not recorded, open, no verdict yet');
  });

  it('marks the fraction that the page is about, and only that one', () => {
    expect(picture.match(/aria-current="page"/g)).toHaveLength(1);
    expect(picture).toMatch(/aria-current="page"[^>]*><title>2 /);
  });

  it('has a table with one row a receiver as its twin', () => {
    const table = markup.slice(markup.indexOf('<table'));
    expect(table.match(/<th scope="row"/g)).toHaveLength(segments.length);
    expect(table).toContain('not weighed');
  });

  it('gives every cut a ground of its own, so that it reads without colour', () => {
    expect(picture).toContain('fill="url(#cut-fore-run)"');
    expect(picture).toContain('fill="url(#cut-residue)"');
  });

  it('says what to do when there is no receiver yet', () => {
    expect(renderToStaticMarkup(<CutStrip segments={[]} />)).toContain(
      'Start a fraction when the first drop falls',
    );
  });
});
