export type PurityPeak = { number: number; areaPercent: number; compoundId: string | null };

export type TargetPurity = {
  /** Area per cent of the target in the integration in force. */
  areaPercent: number;
  peakNumbers: number[];
  /** How the target's peak was known. */
  basis: 'assigned' | 'largest';
};

/**
 * Area per cent of the target: the sum of the peaks assigned to it, else the largest peak, and then it
 * says so. A largest peak that is assigned to another compound is not the target: null. No peaks: null.
 */
export function targetPurity(peaks: PurityPeak[], targetCompoundId: string): TargetPurity | null {
  const assigned = peaks.filter((peak) => peak.compoundId === targetCompoundId);
  if (assigned.length > 0) {
    return {
      areaPercent: assigned.reduce((sum, peak) => sum + peak.areaPercent, 0),
      peakNumbers: assigned.map((peak) => peak.number),
      basis: 'assigned',
    };
  }
  const [largest] = [...peaks].sort((a, b) => b.areaPercent - a.areaPercent);
  if (!largest || largest.compoundId !== null) return null;
  return { areaPercent: largest.areaPercent, peakNumbers: [largest.number], basis: 'largest' };
}
