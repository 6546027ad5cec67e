import { plateProfiles, profilesQuery, profilesResponse } from '@/lib/evidence/tlc/plate-profiles';
import { plateId } from '@/lib/evidence/tlc/schema';
import { route } from '@/lib/http/route';

export const GET = route({
  summary: 'Profiles of the lanes of a plate photo, areas of the spots, and estimates by diluted lanes',
  params: plateId,
  query: profilesQuery,
  response: profilesResponse,
  handle: async ({ actor, params, query }) => ({
    json: await plateProfiles(actor, params.id, query.photo),
  }),
});
