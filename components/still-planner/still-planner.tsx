'use client';
import { Tabs } from '@/components/ui/tabs';
import { BoilingPointForm } from './boiling-point-form';
import { PressureForm } from './pressure-form';
import { SeparationForm } from './separation-form';

/** The sums before a distillation; nothing here is saved. */
export function StillPlanner() {
  return (
    <Tabs
      label="What to work out"
      tabs={[
        { value: 'boiling-point', label: 'Boiling point', content: <BoilingPointForm /> },
        { value: 'pressure', label: 'Pressure', content: <PressureForm /> },
        { value: 'separation', label: 'Separation', content: <SeparationForm /> },
      ]}
    />
  );
}
