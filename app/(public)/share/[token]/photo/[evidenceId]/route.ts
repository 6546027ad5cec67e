import { z } from 'zod';
import { previewResponse } from '@/lib/evidence/preview';
import { previewQuery } from '@/lib/evidence/schema';
import { route } from '@/lib/http/route';
import { requireSharedPhoto } from '@/lib/signoff/find-shared-photo';

export const GET = route({
  summary: 'A small picture of a photo on a shared sheet, upright and without metadata',
  access: 'public',
  params: z.object({ token: z.string().max(200), evidenceId: z.uuid() }),
  query: previewQuery,
  responseType: 'image/webp',
  handle: async ({ params, query, request }) => {
    const photo = await requireSharedPhoto(params.token, params.evidenceId);
    const response = await previewResponse(photo, query.width, request);
    // Asked for anew each time, so that a link that was revoked shows nothing from the browser's store.
    response.headers.set('cache-control', 'private, no-cache');
    response.headers.set('referrer-policy', 'no-referrer');
    return response;
  },
});
