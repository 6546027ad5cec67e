import { fractionSheetSchema } from '@/lib/acceptance/fraction-sheet-schema';
import { presentFractionSheet } from '@/lib/acceptance/fraction-sheet';
import { changeFraction } from '@/lib/distillation/change-fraction';
import { fractionChangeSchema, fractionSchema } from '@/lib/distillation/fraction-schema';
import { presentFraction } from '@/lib/distillation/present';
import { codeParams } from '@/lib/distillation/quantities';
import { requireFraction } from '@/lib/distillation/require-fraction';
import { route } from '@/lib/http/route';
import { entityTag, requireIfMatch } from '@/lib/http/version';

export const GET = route({
  summary: 'One fraction with its evidence, verdict, coverage and signatures',
  params: codeParams,
  response: fractionSheetSchema,
  handle: async ({ actor, params }) => {
    const sheet = await presentFractionSheet(actor, params.code);
    return { json: sheet, headers: { etag: entityTag(sheet) } };
  },
});

export const PATCH = route({
  summary: 'Change the facts of a fraction; send the version that you changed as If-Match',
  params: codeParams,
  body: fractionChangeSchema,
  response: fractionSchema,
  handle: async ({ actor, params, body, request }) => {
    await changeFraction(actor, params.code, body, requireIfMatch(request));
    const fraction = await requireFraction(actor, params.code);
    return { json: presentFraction(fraction), headers: { etag: entityTag(fraction) } };
  },
});
