import { linearScale } from '@/components/charts/scale';

export type ProfileData = {
  rf: readonly number[];
  signal: readonly number[];
  areas: readonly { fromRf: number; toRf: number; rf: number }[];
};

/** Path of a lane's profile in a box, Rf to the right and signal upwards, and where each spot's area lies. */
export function profileShape(
  { rf, signal, areas }: ProfileData,
  width: number,
  height: number,
  most: number,
) {
  const x = linearScale([rf[0] ?? 0, rf.at(-1) ?? 1], [0, width]);
  const y = linearScale([0, Math.max(most, 1e-9)], [height, 6]);
  const place = (value: number) => value.toFixed(1);
  const path = rf
    .map((one, i) => `${i === 0 ? 'M' : 'L'}${place(x(one))} ${place(y(signal[i] ?? 0))}`)
    .join('');
  return {
    path,
    origin: x(0),
    front: x(1),
    areas: areas.map((area) => ({ left: x(area.fromRf), right: x(area.toRf), middle: x(area.rf) })),
  };
}
