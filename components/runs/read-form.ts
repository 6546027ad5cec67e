import { parseMassG } from '@/lib/units/mass';
import { formatPressure, parsePressureMbar, type PressureUnit } from '@/lib/units/pressure';
import { parseTemperatureC } from '@/lib/units/temperature';

export type Problems = Record<string, string>;

/** Reads typed numbers one after the other and keeps the problems by the field's name in the API. */
export class FormReader {
  readonly problems: Problems = {};

  private take(
    name: string,
    text: string,
    read: (text: string) => { ok: true; value: number } | { ok: false; problem: string },
  ) {
    if (text.trim() === '') return null;
    const parsed = read(text);
    if (parsed.ok) return parsed.value;
    this.problems[name] = parsed.problem;
    return null;
  }

  /** g; null for an empty field. */
  massG(name: string, text: string): number | null {
    return this.take(name, text, (t) => parseMassG(t));
  }

  temperatureC(name: string, text: string): number | null {
    return this.take(name, text, (t) => parseTemperatureC(t));
  }

  pressureMbar(name: string, text: string, unit: PressureUnit): number | null {
    return this.take(name, text, (t) => parsePressureMbar(t, unit));
  }

  /** A bare number, such as theoretical stages or mL. */
  number(name: string, text: string): number | null {
    return this.take(name, text, (t) => {
      const value = Number(t.trim().replace(',', '.'));
      return Number.isFinite(value)
        ? { ok: true, value }
        : { ok: false, problem: `"${t.trim()}" is not a number.` };
    });
  }

  require(name: string, present: boolean, problem: string): void {
    if (!present && !this.problems[name]) this.problems[name] = problem;
  }

  get fine(): boolean {
    return Object.keys(this.problems).length === 0;
  }
}

/** A kept pressure as text for a field that is read in `unit`. */
export function pressureText(pressureMbar: number | null, unit: PressureUnit): string {
  return pressureMbar === null ? '' : formatPressure(pressureMbar, unit).split(' ')[0]!;
}

/** A kept number as text, with all its digits. */
export function numberText(value: number | null): string {
  return value === null ? '' : String(value);
}
