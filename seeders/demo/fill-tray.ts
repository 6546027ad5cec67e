import type { TokenActor } from '@/lib/auth/actor';
import type { Composition } from './run-plan';
import { sendFile } from './send-file';
import { CITRAL, GERANIOL, LIMONENE, LINALOOL, MYRCENE } from './substances';
import { writeTrace } from './write-trace';

/** Files that the instrument PC sent without a fraction that exists: they wait for a person. */
export async function fillTray(instrument: TokenActor, today: Date): Promise<void> {
  const waiting: { fraction: string | undefined; name: string; composition: Composition }[] = [
    {
      fraction: 'D-2019-0417-F2',
      name: 'seq0417_02_FID_invented.csv',
      composition: { [LIMONENE]: 98.8, [MYRCENE]: 1.2 },
    },
    {
      fraction: undefined,
      name: 'unlabelled_vial_FID_invented.csv',
      composition: { [LINALOOL]: 96.9, [GERANIOL]: 3.1 },
    },
    {
      fraction: 'citral-heart',
      name: 'citral-heart_FID_invented.csv',
      composition: { [CITRAL]: 97.7, [GERANIOL]: 2.3 },
    },
  ];
  for (const { fraction, name, composition } of waiting) {
    const bytes = writeTrace(`tray ${name}`, composition, 'FID');
    const place = fraction === undefined ? {} : { fraction };
    await sendFile(instrument, place, { bytes, fileName: name, kind: 'gc-trace', takenAt: today });
  }
}
