import { canonicalJson, digestOfText } from '@/lib/acceptance/digest';
import { judgeFraction } from '@/lib/acceptance/judge-fraction';
import { type Recorder, recorded } from '@/lib/audit/recorded';
import { type Actor, rolesIn } from '@/lib/auth/actor';
import { authorise } from '@/lib/auth/authorise';
import { requirePerson } from '@/lib/auth/require-person';
import { newId } from '@/lib/database/ids';
import { type Fraction, Signature } from '@/lib/database/records';
import { requireFraction } from '@/lib/distillation/require-fraction';
import { Problem } from '@/lib/errors';
import { buildManifest } from './build-manifest';
import { confirmPassword } from './confirm-password';
import type { SignOffBody } from './schema';
import { whyNotReleasable, whyNotTheSigner } from './sign-off-rules';
import { newSignatureCode } from './signature-code';
import { lockForStep, writeTransition } from './take-step';
import { tellPeople } from './tell-people';

type Input = SignOffBody & { version: number | null };
type Signed = { fraction: Fraction; signature: Signature };

/**
 * Signs a submitted fraction off: the role, another person than the one who collected it, the password again
 * (before the transaction, since it takes its time), and a verdict of pass computed anew under the row's lock.
 * The signature is bound to the SHA-256 of the canonical manifest. Of two people at once, one gets 409.
 */
export async function signOffFraction(actor: Actor, code: string, input: Input): Promise<Signed> {
  const person = requirePerson(actor);
  const seen = await requireFraction(actor, code);
  authorise(actor, 'fraction.signOff', seen.groupId);
  const notTheSigner = whyNotTheSigner(actor, seen);
  if (notTheSigner) throw new Problem('not-allowed', notTheSigner);
  await confirmPassword(person, input.password);
  return recorded(actor, async (recorder) => {
    const step = { action: 'signOff', right: 'fraction.signOff', version: input.version } as const;
    const fraction = await lockForStep(recorder, code, step);
    await judgeFraction(recorder, fraction);
    const notReleasable = whyNotReleasable(fraction.verdictState);
    if (notReleasable) throw new Problem('state-conflict', notReleasable);
    const signature = await writeSignature(recorder, fraction, person, input);
    await tellPeople(recorder, fraction, {
      kind: 'fraction.signed_off',
      roles: ['pi'],
      userIds: [fraction.collectedById],
      subject: `${fraction.code} was signed off`,
      lines: [
        `${person.name} signed off fraction ${fraction.code}: ${input.meaning}.`,
        `Its verification code is ${signature.code}.`,
      ],
    });
    return { fraction, signature };
  });
}

async function writeSignature(
  recorder: Recorder,
  fraction: Fraction,
  person: { userId: string; name: string },
  input: Input,
): Promise<Signature> {
  const { transaction, record, actor } = recorder;
  const signedAt = new Date();
  const roles = rolesIn(actor, fraction.groupId);
  const facts = {
    code: newSignatureCode(),
    signerId: person.userId,
    signerName: person.name,
    role: roles.includes('pi') ? 'pi' : 'analyst',
    meaning: input.meaning,
    comment: input.comment || null,
  };
  const signedAs = { ...facts, signedAt: signedAt.toISOString() };
  const manifest = canonicalJson(await buildManifest(fraction, signedAs, transaction));
  const signature = await Signature.create(
    {
      id: newId(),
      fractionId: fraction.id,
      ...facts,
      manifest,
      manifestDigest: digestOfText(manifest),
      verdictId: fraction.verdictId as string,
      signedAt,
    },
    { transaction },
  );
  await fraction.update({ status: 'signed off' }, { transaction });
  const reason = input.comment || null;
  await writeTransition(recorder, fraction, {
    action: 'sign off',
    from: 'submitted',
    to: 'signed off',
    reason,
    at: signedAt,
  });
  record({
    type: 'fraction.signed_off',
    recordType: 'fraction',
    recordId: fraction.id,
    groupId: fraction.groupId,
    before: { status: 'submitted' },
    after: {
      status: 'signed off',
      signatureId: signature.id,
      meaning: signature.meaning,
      manifestDigest: signature.manifestDigest,
      verdictId: signature.verdictId,
    },
    reason,
  });
  return signature;
}
