import type { AssociationClass } from './associates';

/** Wagner coefficients: ln(P/Pc) = (a t + b t^1.5 + c t^2.5 + d t^5) Tc/T, t = 1 - T/Tc. */
export type WagnerSet = {
  tcK: number;
  pcKPa: number;
  a: number;
  b: number;
  c: number;
  d: number;
  source: string;
};

/** Antoine coefficients: log10(P/kPa) = a - b/(t/°C + c), valid from tMinC to tMaxC. */
export type AntoineSet = { a: number; b: number; c: number; tMinC: number; tMaxC: number; source: string };

/** What is known of one liquid's vapour pressure. The normal boiling point is at 101.325 kPa. */
export type VapourPressureData = {
  name: string;
  normalBoilingPointC: number;
  normalBoilingPointSource: string;
  wagner?: WagnerSet;
  antoine?: AntoineSet;
  /** Hydrogen bonds hold the liquid together: see associates.ts. */
  associated: boolean;
  /** The finer class where the structure is known; without it an associated liquid gets the common correction. */
  associationClass?: AssociationClass;
};
