import { codeParams } from '@/lib/distillation/quantities';
import { route } from '@/lib/http/route';
import { entityTag } from '@/lib/http/version';
import { presentStep } from '@/lib/signoff/present-signature';
import { signOffBody, stepSchema } from '@/lib/signoff/schema';
import { sentVersion } from '@/lib/signoff/sent-version';
import { signOffFraction } from '@/lib/signoff/sign-off-fraction';

export const POST = route({
  summary: 'Sign a submitted fraction off, with the password again and the meaning of the signature',
  params: codeParams,
  body: signOffBody,
  response: stepSchema,
  handle: async ({ actor, params, body, request }) => {
    const input = { ...body, version: sentVersion(request) };
    const { fraction, signature } = await signOffFraction(actor, params.code, input);
    return { json: presentStep(fraction, signature), headers: { etag: entityTag(fraction) } };
  },
});
