import { describe, expect, it } from 'vitest';
import type { FractionJson } from '@/lib/distillation/fraction-schema';
import { fractionFormOf, readFractionForm } from './fraction-form-state';

const kept = { cut: 'heart', tareMassG: 50, grossMassG: 92.5, pressureMbar: 19.998 } as FractionJson;

describe('the form of a fraction', () => {
  it('sends a pressure that was not touched with all its digits, in whatever unit it is shown', () => {
    const state = fractionFormOf(kept, 'mmHg');
    expect(state.pressure).toBe('15.0');
    expect(readFractionForm(state, 'mmHg', kept).body.pressureMbar).toBe(19.998);
  });

  it('reads a pressure that was typed in the unit beside it', () => {
    const state = { ...fractionFormOf(kept, 'kPa'), pressure: '5' };
    expect(readFractionForm(state, 'kPa', kept).body.pressureMbar).toBeCloseTo(50, 9);
  });

  it('sends an emptied field as null', () => {
    const state = { ...fractionFormOf(kept, 'mbar'), gross: '' };
    expect(readFractionForm(state, 'mbar', kept).body.grossMassG).toBeNull();
  });

  it('asks for the cut, and finds swapped masses before they are sent', () => {
    const state = { ...fractionFormOf(null, 'mbar'), tare: '92.5', gross: '50' };
    expect(Object.keys(readFractionForm(state, 'mbar', null).problems)).toEqual(['cut', 'grossMassG']);
  });
});
