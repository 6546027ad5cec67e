/** What a literature value may depend on, and must then be stored with it. */
export type Condition = 'temperatureC' | 'pressureKPa' | 'wavelengthNm' | 'rangeMinC' | 'rangeMaxC';

export interface PropertyDefinition {
  /** Unit of the value, or of what the coefficients take and give. */
  unit: string;
  /** Names of the coefficients; absent where the property is one number. */
  coefficients?: readonly string[];
  /** Conditions without which the value says nothing. */
  requires: readonly Condition[];
  /** Conditions that belong to the value, but that older tables lost: asked for, and shown as missing. */
  wants: readonly Condition[];
  /** A value outside is taken for a slip of the pen. Common practice, wide on purpose. */
  plausible: { min: number; max: number };
  /** Places shown after the decimal point. */
  decimals: number;
}

/** Pressure in kPa at which a normal boiling point holds (IUPAC: 1 atm). */
export const NORMAL_PRESSURE_KPA = 101.325;
/** Sodium D line in nm, the wavelength of nD. */
export const SODIUM_D_NM = 589.3;

/**
 * The closed list of literature properties.
 * Antoine: log10(P/kPa) = A - B/(t/°C + C). Wagner: ln(P/Pc) = (A x + B x^1.5 + C x^2.5 + D x^5) Tc/T with
 * x = 1 - T/Tc, T in K (VDI Heat Atlas form).
 */
export const LITERATURE_PROPERTIES = {
  'normal boiling point': {
    unit: '°C',
    requires: ['pressureKPa'],
    wants: [],
    plausible: { min: -50, max: 500 },
    decimals: 1,
  },
  'boiling point at pressure': {
    unit: '°C',
    requires: ['pressureKPa'],
    wants: [],
    plausible: { min: -100, max: 500 },
    decimals: 1,
  },
  'refractive index': {
    unit: '1',
    requires: ['temperatureC', 'wavelengthNm'],
    wants: [],
    plausible: { min: 1.2, max: 1.9 },
    decimals: 4,
  },
  'temperature coefficient of refractive index': {
    unit: '1/°C',
    requires: ['wavelengthNm'],
    wants: ['temperatureC'],
    plausible: { min: 0.00005, max: 0.0015 },
    decimals: 5,
  },
  density: {
    unit: 'g/mL',
    requires: [],
    wants: ['temperatureC'],
    plausible: { min: 0.4, max: 4 },
    decimals: 4,
  },
  'heat of vaporisation': {
    unit: 'kJ/mol',
    requires: [],
    wants: ['temperatureC'],
    plausible: { min: 5, max: 200 },
    decimals: 2,
  },
  'flash point': {
    unit: '°C',
    requires: [],
    wants: [],
    plausible: { min: -100, max: 400 },
    decimals: 0,
  },
  'autoignition temperature': {
    unit: '°C',
    requires: [],
    wants: [],
    plausible: { min: 50, max: 900 },
    decimals: 0,
  },
  'Antoine coefficients': {
    unit: 'kPa, °C',
    coefficients: ['A', 'B', 'C'],
    requires: ['rangeMinC', 'rangeMaxC'],
    wants: [],
    plausible: { min: -100, max: 10_000 },
    decimals: 5,
  },
  'Wagner coefficients': {
    unit: 'kPa, K',
    coefficients: ['criticalTemperatureK', 'criticalPressureKPa', 'A', 'B', 'C', 'D'],
    requires: [],
    wants: [],
    plausible: { min: -200, max: 50_000 },
    decimals: 5,
  },
} as const satisfies Record<string, PropertyDefinition>;

export type LiteratureProperty = keyof typeof LITERATURE_PROPERTIES;
export const LITERATURE_PROPERTY_NAMES = Object.keys(LITERATURE_PROPERTIES) as LiteratureProperty[];

/** True for a name of the closed list. */
export function isLiteratureProperty(name: string): name is LiteratureProperty {
  return Object.hasOwn(LITERATURE_PROPERTIES, name);
}

/** Unit, conditions and plausible range of a property. */
export function propertyDefinition(property: LiteratureProperty): PropertyDefinition {
  return LITERATURE_PROPERTIES[property];
}
