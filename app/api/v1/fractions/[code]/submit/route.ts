import { codeParams } from '@/lib/distillation/quantities';
import { route } from '@/lib/http/route';
import { entityTag } from '@/lib/http/version';
import { presentStep } from '@/lib/signoff/present-signature';
import { stepSchema, submitBody } from '@/lib/signoff/schema';
import { sentVersion } from '@/lib/signoff/sent-version';
import { submitFraction } from '@/lib/signoff/submit-fraction';

export const POST = route({
  summary: 'Submit a fraction for sign-off; it keeps the specification in force now',
  params: codeParams,
  body: submitBody,
  response: stepSchema,
  handle: async ({ actor, params, body, request }) => {
    const input = { comment: body.comment, version: sentVersion(request) };
    const fraction = await submitFraction(actor, params.code, input);
    return { json: presentStep(fraction), headers: { etag: entityTag(fraction) } };
  },
});
