import type { z } from 'zod';
import type { Fraction, Signature } from '@/models';
import type { signatureSchema, stepSchema } from './schema';

/** A signature as JSON; the manifest itself stays inside. */
export function presentSignature(signature: Signature): z.output<typeof signatureSchema> {
  return {
    id: signature.id,
    code: signature.code,
    signer: signature.signerName,
    role: signature.role,
    meaning: signature.meaning,
    comment: signature.comment ?? null,
    signedAt: signature.signedAt.toISOString(),
    manifestDigest: signature.manifestDigest,
    inForce: !signature.supersededAt,
    supersededAt: signature.supersededAt?.toISOString() ?? null,
    supersededReason: signature.supersededReason ?? null,
  };
}

/** Where a fraction stands after a step. */
export function presentStep(fraction: Fraction, signature?: Signature): z.output<typeof stepSchema> {
  return {
    code: fraction.code,
    status: fraction.status,
    verdictState: fraction.verdictState,
    version: fraction.version,
    ...(signature && { signature: presentSignature(signature) }),
  };
}
