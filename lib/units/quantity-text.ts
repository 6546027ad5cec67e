/** A number read from a person's text, in the wanted unit, or a sentence that says how to write it. */
export type Parsed<Unit extends string> =
  { ok: true; value: number; unit: Unit } | { ok: false; problem: string };

const NUMBER_THEN_UNIT = /^([+-]?(?:\d+(?:[.,]\d*)?|[.,]\d+)(?:e[+-]?\d{1,3})?)\s*(.*)$/i;

/**
 * Splits "23,5 °C" into number and unit. A comma or a point is the decimal sign; a text with both, or with
 * one of them twice, is refused, since "1.234,5" and "1,234.5" cannot be told from a slip of the finger.
 *
 * @param units spelling in lower case without spaces -> unit
 * @param fallback the unit when none is written
 */
export function parseQuantity<Unit extends string>(
  text: string,
  units: Readonly<Record<string, Unit>>,
  fallback: Unit,
  example: string,
): Parsed<Unit> {
  const tidy = text
    .normalize('NFKC')
    .replace(/[\u2212\u2013]/g, '-')
    .trim();
  if (tidy === '') return { ok: false, problem: `Enter a number, for example "${example}".` };
  const match = NUMBER_THEN_UNIT.exec(tidy);
  if (!match) return { ok: false, problem: `"${text.trim()}" is not a number: write it as "${example}".` };
  const unitText = match[2]!.replace(/\s+/g, '').toLowerCase();
  if (/^[\d.,]/.test(unitText)) {
    return {
      ok: false,
      problem: `"${text.trim()}" has more than one separator: write it without thousands separators, as "${example}".`,
    };
  }
  const unit = unitText === '' ? fallback : Object.hasOwn(units, unitText) ? units[unitText] : undefined;
  if (unit === undefined) {
    const known = [...new Set(Object.values(units))].join(', ');
    return { ok: false, problem: `"${match[2]}" is not a unit known here: use one of ${known}.` };
  }
  const value = Number(match[1]!.replace(',', '.'));
  if (!Number.isFinite(value)) return { ok: false, problem: `"${text.trim()}" is too large a number.` };
  return { ok: true, value, unit };
}

/** Three significant figures below 100, whole numbers with thin grouping left out above: plain and sortable. */
export function significant(value: number, figures = 3): string {
  if (value === 0) return '0';
  const magnitude = Math.floor(Math.log10(Math.abs(value)));
  const decimals = Math.min(12, Math.max(0, figures - 1 - magnitude));
  return value.toFixed(decimals);
}
