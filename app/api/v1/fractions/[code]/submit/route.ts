import { codeParams } from '@/lib/distillation/quantities';
import { readJson } from '@/lib/http/read-body';
import { route } from '@/lib/http/route';
import { entityTag } from '@/lib/http/version';
import { presentStep } from '@/lib/signoff/present-signature';
import { stepSchema, submitBody } from '@/lib/signoff/schema';
import { sentVersion } from '@/lib/signoff/sent-version';
import { submitFraction } from '@/lib/signoff/submit-fraction';

export const POST = route({
  summary:
    'Submit a fraction for sign-off; it keeps the specification in force now. The body is optional: {"comment": "…"}',
  params: codeParams,
  response: stepSchema,
  handle: async ({ actor, params, request }) => {
    // Nothing has to be said to submit, so a call without a body is right too.
    const said = request.headers.has('content-type') ? (await readJson(request, submitBody)).value : {};
    const input = { comment: said.comment, version: sentVersion(request) };
    const fraction = await submitFraction(actor, params.code, input);
    return { json: presentStep(fraction), headers: { etag: entityTag(fraction) } };
  },
});
