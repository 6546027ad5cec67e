import { uploadAnswer, uploadQuery } from '@/lib/evidence/schema';
import { uploadEvidence } from '@/lib/evidence/upload-evidence';
import { route } from '@/lib/http/route';

export const POST = route({
  summary: 'Store a file as evidence: raw body with X-Filename, or multipart with a part "file"',
  token: 'evidence:write',
  query: uploadQuery,
  rawBody: { contentTypes: ['multipart/form-data', 'application/octet-stream'] },
  status: 201,
  response: uploadAnswer,
  handle: ({ actor, query, request }) => uploadEvidence(actor, query, request),
});
