import QRCode from 'qrcode';
import type { Actor } from '@/lib/auth/actor';
import { env } from '@/lib/env';
import { formatMass } from '@/lib/units/mass';
import type { FractionJson } from './fraction-schema';
import { listFractionsOfRun } from './list-fractions-of-run';

export type FractionLabel = {
  code: string;
  url: string;
  /** A square drawing without a size of its own. */
  qrSvg: string;
  compound: string;
  cut: string;
  netMass: string | null;
  head: string | null;
  collected: string;
  storagePlace: string | null;
};

const mostLabels = 200;

/** The labels of a run's fractions, or of one of them. The QR code holds the fraction's full address. */
export async function listFractionLabels(
  actor: Actor,
  runCode: string,
  only: string | undefined,
): Promise<FractionLabel[]> {
  const { items } = await listFractionsOfRun(actor, runCode, { limit: mostLabels });
  return Promise.all(items.filter((fraction) => only === undefined || fraction.code === only).map(labelOf));
}

/** Quartile correction: a label that lost a quarter of its modules to a drop of solvent still reads. */
async function labelOf(fraction: FractionJson): Promise<FractionLabel> {
  const url = `${env().publicUrl}/fractions/${fraction.code}`;
  const { headTemperatureFromC: from, headTemperatureToC: to } = fraction;
  return {
    code: fraction.code,
    url,
    qrSvg: await QRCode.toString(url, { type: 'svg', errorCorrectionLevel: 'Q', margin: 2 }),
    compound: fraction.compound.name,
    cut: fraction.cut,
    netMass: fraction.netMassG === null ? null : formatMass(fraction.netMassG),
    head: from === null || to === null ? null : `${from.toFixed(1)} to ${to.toFixed(1)} °C`,
    collected: `${fraction.collectedAt.slice(0, 10)}, ${fraction.collectedBy.name}`,
    storagePlace: fraction.storagePlace,
  };
}
