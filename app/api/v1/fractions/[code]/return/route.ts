import { codeParams } from '@/lib/distillation/quantities';
import { route } from '@/lib/http/route';
import { entityTag } from '@/lib/http/version';
import { presentStep } from '@/lib/signoff/present-signature';
import { returnFraction } from '@/lib/signoff/return-fraction';
import { returnBody, stepSchema } from '@/lib/signoff/schema';
import { sentVersion } from '@/lib/signoff/sent-version';

export const POST = route({
  summary: 'Return a submitted fraction with a reason',
  params: codeParams,
  body: returnBody,
  response: stepSchema,
  handle: async ({ actor, params, body, request }) => {
    const input = { reason: body.reason, version: sentVersion(request) };
    const fraction = await returnFraction(actor, params.code, input);
    return { json: presentStep(fraction), headers: { etag: entityTag(fraction) } };
  },
});
