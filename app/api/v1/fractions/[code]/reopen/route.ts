import { codeParams } from '@/lib/distillation/quantities';
import { route } from '@/lib/http/route';
import { entityTag } from '@/lib/http/version';
import { presentStep } from '@/lib/signoff/present-signature';
import { reopenFraction } from '@/lib/signoff/reopen-fraction';
import { reopenBody, stepSchema } from '@/lib/signoff/schema';
import { sentVersion } from '@/lib/signoff/sent-version';

export const POST = route({
  summary: 'Reopen a signed-off fraction with a reason; its signature is superseded, not deleted',
  params: codeParams,
  body: reopenBody,
  response: stepSchema,
  handle: async ({ actor, params, body, request }) => {
    const input = { reason: body.reason, version: sentVersion(request) };
    const fraction = await reopenFraction(actor, params.code, input);
    return { json: presentStep(fraction), headers: { etag: entityTag(fraction) } };
  },
});
