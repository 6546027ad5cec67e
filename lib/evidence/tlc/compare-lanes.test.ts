import { describe, expect, it } from 'vitest';
import { compareLanes, type ComparedLane } from './compare-lanes';

const u = 0.012;
const lane = (label: string, subject: ComparedLane['subject'], ...rfs: number[]): ComparedLane => ({
  id: label,
  label,
  subject,
  spots: rfs.map((rf) => ({ rf, rfUncertainty: u })),
});
const ester = { id: 'c1', name: 'ethyl acetate' };

describe('same-plate comparison', () => {
  it('finds the reference at the same place within 2 sqrt(u1² + u2²) = 0.034 (JCGM 100:2008)', () => {
    const lanes = [
      lane('F', { kind: 'fraction', code: 'D-1' }, 0.44, 0.6),
      lane('R', { kind: 'reference', compound: ester }, 0.47),
    ];
    const [near, far] = compareLanes(lanes);
    expect(near!.agreesWith).toEqual([
      expect.objectContaining({ laneId: 'R', compound: ester, spotIndex: 0, kind: 'reference' }),
    ]);
    expect(near!.agreesWith[0]!.limit).toBeCloseTo(0.0339, 4);
    expect(near!.words).toBe(
      'Spot at Rf 0.44 in lane F (D-1) agrees with lane R (ethyl acetate) at Rf 0.47 (ΔRf 0.030, limit 0.034: the same place within the uncertainty).',
    );
    expect(far!.agreesWith).toEqual([]);
    expect(far!.words).toContain('agrees with no reference; the nearest is lane R');
  });

  it('judges crude lanes too, and neither references nor blanks', () => {
    const lanes = [
      lane('C', { kind: 'crude' }, 0.3),
      lane('R', { kind: 'reference' }, 0.3),
      lane('B', { kind: 'blank' }, 0.3),
    ];
    expect(compareLanes(lanes).map((one) => one.label)).toEqual(['C']);
  });

  it('says so where there is nothing to compare with', () => {
    const [only] = compareLanes([lane('F', { kind: 'fraction' }, 0.3)]);
    expect(only!.words).toContain('no reference on this plate has a spot');
  });

  it('believes a co-spot that shows two spots more than an agreement in Rf', () => {
    const lanes = [
      lane('F', { kind: 'fraction', code: 'D-1' }, 0.44),
      lane('R', { kind: 'reference', compound: ester }, 0.46),
      lane('FR', { kind: 'co-spot', code: 'D-1', compound: ester }, 0.435, 0.465),
    ];
    expect(compareLanes(lanes)[0]!.words).toContain('shows 2 spots there, so they are different compounds');
  });
});
