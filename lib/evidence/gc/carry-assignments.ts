type Assigned = { retentionTimeMin: number; compoundId: string | null };
type Found = { number: number; retentionTimeMin: number; startMin: number; endMin: number };

/**
 * Takes assignments over from one version of an integration to the next: each goes to the new peak within whose bounds
 * the old apex lies, the nearest apex first; one peak gets one compound. Returns compound ids by new peak number.
 */
export function carryAssignments(before: readonly Assigned[], found: readonly Found[]): Map<number, string> {
  const carried = new Map<number, string>();
  const pairs = before.flatMap((old) => {
    if (old.compoundId === null) return [];
    const compoundId = old.compoundId;
    return found
      .filter((peak) => peak.startMin <= old.retentionTimeMin && old.retentionTimeMin <= peak.endMin)
      .map((peak) => ({
        old,
        compoundId,
        peak,
        distance: Math.abs(peak.retentionTimeMin - old.retentionTimeMin),
      }));
  });
  const placed = new Set<Assigned>();
  for (const { old, compoundId, peak } of pairs.sort((a, b) => a.distance - b.distance)) {
    if (placed.has(old) || carried.has(peak.number)) continue;
    placed.add(old);
    carried.set(peak.number, compoundId);
  }
  return carried;
}
