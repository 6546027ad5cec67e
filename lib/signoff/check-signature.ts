import { canonicalJson, digestOfText } from '@/lib/acceptance/digest';
import { Fraction, Signature } from '@/lib/database/records';
import { buildManifest, type SignedAs } from './build-manifest';
import { readSignatureCode } from './signature-code';

export type SignatureCheck =
  | { known: false }
  | {
      known: true;
      /** The kept manifest still has the digest that was signed, and it is the manifest of this signature. */
      genuine: boolean;
      /** Not superseded, and the present records still give the manifest that was signed. */
      inForce: boolean;
      signedAt: string;
      supersededAt: string | null;
    };

function readSignedAs(manifest: string): SignedAs | null {
  try {
    return (JSON.parse(manifest) as { signature?: SignedAs }).signature ?? null;
  } catch {
    return null;
  }
}

/** Whether the kept manifest is whole and belongs to this very row: code, signer, meaning and time. */
function isGenuine(signature: Signature, signedAs: SignedAs | null): boolean {
  return (
    signedAs !== null &&
    digestOfText(signature.manifest) === signature.manifestDigest &&
    signedAs.code === signature.code &&
    signedAs.signerId === signature.signerId &&
    signedAs.signerName === signature.signerName &&
    signedAs.role === signature.role &&
    signedAs.meaning === signature.meaning &&
    signedAs.comment === signature.comment &&
    signedAs.signedAt === signature.signedAt.toISOString()
  );
}

/**
 * Checks a signature by its public code, for anybody: only whether it is genuine and in force. It tells
 * nothing of the fraction, the compound or the people. The manifest is built anew from the present records.
 */
export async function checkSignature(typedCode: string): Promise<SignatureCheck> {
  const code = readSignatureCode(typedCode);
  const signature = code ? await Signature.findOne({ where: { code } }) : null;
  if (!signature) return { known: false };
  const signedAs = readSignedAs(signature.manifest);
  const genuine = isGenuine(signature, signedAs);
  const fraction = await Fraction.findByPk(signature.fractionId);
  const unchanged =
    fraction !== null &&
    signedAs !== null &&
    digestOfText(canonicalJson(await buildManifest(fraction, signedAs))) === signature.manifestDigest;
  return {
    known: true,
    genuine,
    inForce: genuine && unchanged && signature.supersededAt === null,
    signedAt: signature.signedAt.toISOString(),
    supersededAt: signature.supersededAt?.toISOString() ?? null,
  };
}
