import type { CompoundFacts } from '../judge-inputs';

/** Compounds that give a flame ionisation detector nothing, or hardly anything, to ionise (METHODS 5; common practice). */
const INVISIBLE_TO_FLAME: Readonly<Record<string, string>> = {
  '7732-18-5': 'water',
  '64-18-6': 'formic acid',
  '50-00-0': 'formaldehyde',
  '75-15-0': 'carbon disulfide',
};

/** Detectors whose answer to any compound is known to us, with how they are named in a sentence. */
const DETECTORS: Readonly<Record<string, { name: string; seesAll: boolean }>> = {
  FID: { name: 'a flame ionisation detector', seesAll: false },
  TCD: { name: 'a thermal conductivity detector', seesAll: true },
  MS: { name: 'a mass spectrometer', seesAll: true },
};

/** Whether a gas chromatograph's detector answers to a compound at all. A detector not listed proves nothing. */
export function detectorSight(detector: string, compound: CompoundFacts): { sees: boolean; reason: string } {
  const known = DETECTORS[detector.trim().toUpperCase()];
  if (!known) return { sees: false, reason: `What the detector "${detector}" answers to is not known here.` };
  if (known.seesAll) return { sees: true, reason: `${known.name} answers to ${compound.name}.` };
  const invisible =
    compound.isWater || (compound.casNumber !== null && compound.casNumber in INVISIBLE_TO_FLAME);
  return invisible
    ? { sees: false, reason: `${known.name} does not answer to ${compound.name}.` }
    : { sees: true, reason: `${known.name} answers to the C-H bonds of ${compound.name}.` };
}
