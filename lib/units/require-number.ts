/** Returns the value, or throws a RangeError that names the quantity and its unit. */
export function requireFinite(name: string, value: number): number {
  if (typeof value !== 'number' || !Number.isFinite(value)) {
    throw new RangeError(`${name} must be a finite number, got ${String(value)}.`);
  }
  return value;
}

/** Returns the value if it is finite and above zero; throws a RangeError otherwise. */
export function requirePositive(name: string, value: number): number {
  if (requireFinite(name, value) <= 0) throw new RangeError(`${name} must be above zero, got ${value}.`);
  return value;
}

/** Returns the value if it is finite and not below zero; throws a RangeError otherwise. */
export function requireNotNegative(name: string, value: number): number {
  if (requireFinite(name, value) < 0) throw new RangeError(`${name} must not be negative, got ${value}.`);
  return value;
}

/** Returns the value if it lies in [low, high]; throws a RangeError that states the range otherwise. */
export function requireWithin(name: string, value: number, low: number, high: number): number {
  if (requireFinite(name, value) < low || value > high) {
    throw new RangeError(`${name} must lie between ${low} and ${high}, got ${value}.`);
  }
  return value;
}
