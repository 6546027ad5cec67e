'use client';
import { useSyncExternalStore } from 'react';
import type { PressureUnit } from '@/lib/units/pressure';

/** The units that a person may type pressures in; everything is kept in mbar. */
export const PRESSURE_UNITS = ['mbar', 'mmHg', 'kPa'] as const satisfies readonly PressureUnit[];
export type ChosenPressureUnit = (typeof PRESSURE_UNITS)[number];

const KEY = 'heartcut.pressure-unit';
const changed = new EventTarget();

function read(): ChosenPressureUnit {
  const kept = localStorage.getItem(KEY);
  return PRESSURE_UNITS.find((unit) => unit === kept) ?? 'mbar';
}

function subscribe(onChange: () => void) {
  changed.addEventListener('change', onChange);
  window.addEventListener('storage', onChange);
  return () => {
    changed.removeEventListener('change', onChange);
    window.removeEventListener('storage', onChange);
  };
}

/** The pressure unit that this person chose on this device, and the way to choose another. */
export function usePressureUnit(): [ChosenPressureUnit, (unit: ChosenPressureUnit) => void] {
  const unit = useSyncExternalStore(subscribe, read, () => 'mbar' as const);
  const choose = (next: ChosenPressureUnit) => {
    localStorage.setItem(KEY, next);
    changed.dispatchEvent(new Event('change'));
  };
  return [unit, choose];
}
