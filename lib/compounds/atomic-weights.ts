/**
 * Abridged standard atomic weights in g/mol of the elements met in distilled organic liquids.
 * Source: IUPAC CIAAW, abridged standard atomic weights 2021 (from memory); D: mass of the nuclide.
 */
export const ATOMIC_WEIGHTS_G_MOL: Readonly<Record<string, number>> = {
  H: 1.008,
  D: 2.014,
  Li: 6.94,
  B: 10.81,
  C: 12.011,
  N: 14.007,
  O: 15.999,
  F: 18.998,
  Na: 22.99,
  Mg: 24.305,
  Al: 26.982,
  Si: 28.085,
  P: 30.974,
  S: 32.06,
  Cl: 35.45,
  K: 39.098,
  Ca: 40.078,
  Ti: 47.867,
  Zn: 65.38,
  Ge: 72.63,
  As: 74.922,
  Se: 78.971,
  Br: 79.904,
  Sn: 118.71,
  Te: 127.6,
  I: 126.9,
  Hg: 200.59,
  Pb: 207.2,
};
