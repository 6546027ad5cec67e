/** Two CAS numbers, mass per cent of the first, boiling point in °C at 101.3 kPa, and `two layers` where the condensate parts. */
export type AzeotropeRow = readonly [
  casA: string,
  casB: string,
  massPercentA: number,
  boilingPointC: number,
  layers?: 'two layers',
];

const WATER = '7732-18-5';
const METHANOL = '67-56-1';
const ETHANOL = '64-17-5';
const ISOPROPANOL = '67-63-0';
const TOLUENE = '108-88-3';
const BENZENE = '71-43-2';
const CYCLOHEXANE = '110-82-7';
const HEXANE = '110-54-3';
const ETHYL_ACETATE = '141-78-6';
const ACETONE = '67-64-1';
const CHLOROFORM = '67-66-3';
const CARBON_DISULFIDE = '75-15-0';
const TETRACHLOROMETHANE = '56-23-5';
const TWO_LAYERS = 'two layers';

/** Where the rows come from. Written down without the book at hand: confirm before relying on a composition. */
export const AZEOTROPE_SOURCE =
  'CRC Handbook of Chemistry and Physics, azeotropic data for binary mixtures; Horsley, Azeotropic Data III (from memory)';

export const AZEOTROPE_ROWS: readonly AzeotropeRow[] = [
  // Alcohols with water.
  [ETHANOL, WATER, 95.6, 78.2],
  ['71-23-8', WATER, 71.7, 87.7],
  [ISOPROPANOL, WATER, 87.7, 80.3],
  ['71-36-3', WATER, 57.5, 92.7, TWO_LAYERS],
  ['78-92-2', WATER, 73.2, 87.0],
  ['78-83-1', WATER, 67.0, 89.8, TWO_LAYERS],
  ['75-65-0', WATER, 88.2, 79.9],
  ['71-41-0', WATER, 45.6, 95.8, TWO_LAYERS],
  ['123-51-3', WATER, 50.4, 95.2, TWO_LAYERS],
  ['107-18-6', WATER, 72.3, 88.9],
  ['108-93-0', WATER, 20.0, 97.8, TWO_LAYERS],
  ['100-51-6', WATER, 9.0, 99.9, TWO_LAYERS],
  ['110-80-5', WATER, 28.8, 99.4],
  ['111-76-2', WATER, 20.8, 98.8],
  ['108-95-2', WATER, 9.2, 99.5],
  // Hydrocarbons and chlorinated hydrocarbons with water.
  [HEXANE, WATER, 94.4, 61.6, TWO_LAYERS],
  ['142-82-5', WATER, 87.1, 79.2, TWO_LAYERS],
  [CYCLOHEXANE, WATER, 91.6, 69.5, TWO_LAYERS],
  [BENZENE, WATER, 91.1, 69.3, TWO_LAYERS],
  [TOLUENE, WATER, 79.8, 85.0, TWO_LAYERS],
  ['100-41-4', WATER, 67.0, 92.0, TWO_LAYERS],
  ['108-38-3', WATER, 64.2, 92.0, TWO_LAYERS],
  ['75-09-2', WATER, 98.5, 38.1, TWO_LAYERS],
  [CHLOROFORM, WATER, 97.2, 56.1, TWO_LAYERS],
  [TETRACHLOROMETHANE, WATER, 95.9, 66.8, TWO_LAYERS],
  ['107-06-2', WATER, 91.8, 72.0, TWO_LAYERS],
  ['79-01-6', WATER, 93.7, 73.1, TWO_LAYERS],
  ['127-18-4', WATER, 84.1, 88.5, TWO_LAYERS],
  ['108-90-7', WATER, 71.6, 90.2, TWO_LAYERS],
  // Ethers, ketones, esters, acids and others with water.
  ['60-29-7', WATER, 98.8, 34.2, TWO_LAYERS],
  ['108-20-3', WATER, 95.5, 62.2, TWO_LAYERS],
  ['1634-04-4', WATER, 96.5, 52.6, TWO_LAYERS],
  ['109-99-9', WATER, 95.0, 64.0],
  ['123-91-1', WATER, 81.6, 87.8],
  ['100-66-3', WATER, 59.5, 95.5, TWO_LAYERS],
  ['78-93-3', WATER, 88.0, 73.4],
  ['108-10-1', WATER, 75.7, 87.9, TWO_LAYERS],
  ['108-94-1', WATER, 38.4, 95.0, TWO_LAYERS],
  ['79-20-9', WATER, 95.0, 56.1],
  [ETHYL_ACETATE, WATER, 91.9, 70.4, TWO_LAYERS],
  ['109-60-4', WATER, 86.0, 82.4, TWO_LAYERS],
  ['108-21-4', WATER, 89.4, 76.6, TWO_LAYERS],
  ['123-86-4', WATER, 72.9, 90.7, TWO_LAYERS],
  ['110-19-0', WATER, 83.5, 87.4, TWO_LAYERS],
  ['123-92-2', WATER, 63.7, 93.8, TWO_LAYERS],
  ['64-18-6', WATER, 77.5, 107.2],
  ['98-01-1', WATER, 35.0, 97.9, TWO_LAYERS],
  ['75-05-8', WATER, 83.7, 76.5],
  ['107-13-1', WATER, 85.7, 70.6, TWO_LAYERS],
  ['75-52-5', WATER, 76.4, 83.6, TWO_LAYERS],
  ['110-86-1', WATER, 57.0, 92.6],
  ['121-44-8', WATER, 90.0, 75.8, TWO_LAYERS],
  ['107-15-3', WATER, 81.6, 119.0],
  ['62-53-3', WATER, 19.2, 98.6, TWO_LAYERS],
  // Without water.
  [ETHYL_ACETATE, ETHANOL, 69.0, 71.8],
  [ETHYL_ACETATE, METHANOL, 56.0, 62.1],
  [ETHYL_ACETATE, ISOPROPANOL, 75.0, 75.3],
  [HEXANE, ETHYL_ACETATE, 60.1, 65.2],
  ['79-20-9', METHANOL, 81.3, 53.5],
  [ACETONE, METHANOL, 88.0, 55.5],
  [ACETONE, HEXANE, 59.0, 49.8],
  [ACETONE, CYCLOHEXANE, 67.5, 53.0],
  [ACETONE, CARBON_DISULFIDE, 33.0, 39.2],
  [CHLOROFORM, ACETONE, 80.0, 64.7],
  [CHLOROFORM, METHANOL, 87.4, 53.4],
  [CHLOROFORM, ETHANOL, 93.0, 59.3],
  ['75-09-2', METHANOL, 92.7, 37.8],
  [TETRACHLOROMETHANE, ETHANOL, 84.2, 65.0],
  [TETRACHLOROMETHANE, METHANOL, 79.4, 55.7],
  ['107-06-2', ETHANOL, 63.0, 70.5],
  [CARBON_DISULFIDE, ETHANOL, 91.0, 42.6],
  ['75-05-8', ETHANOL, 44.0, 72.5],
  [BENZENE, ETHANOL, 67.6, 67.8],
  [BENZENE, METHANOL, 60.5, 58.3],
  [BENZENE, ISOPROPANOL, 66.7, 71.9],
  [BENZENE, CYCLOHEXANE, 51.8, 77.5],
  [TOLUENE, ETHANOL, 32.0, 76.7],
  [TOLUENE, METHANOL, 27.6, 63.7],
  [TOLUENE, ISOPROPANOL, 42.0, 80.6],
  [TOLUENE, '71-36-3', 72.3, 105.6],
  [TOLUENE, '64-19-7', 72.0, 105.4],
  [CYCLOHEXANE, ETHANOL, 69.5, 64.9],
  [CYCLOHEXANE, ISOPROPANOL, 67.0, 68.6],
  [HEXANE, ETHANOL, 79.0, 58.7],
  [HEXANE, METHANOL, 72.0, 50.6, TWO_LAYERS],
  [HEXANE, ISOPROPANOL, 77.0, 62.7],
  ['142-82-5', ETHANOL, 52.0, 72.0],
];

/** Rows that boil above both components: the mixture left in the flask runs towards them. */
export const MAXIMUM_PAIRS: ReadonlySet<string> = new Set([
  `64-18-6 ${WATER}`,
  `107-15-3 ${WATER}`,
  `${CHLOROFORM} ${ACETONE}`,
]);
