import { createHash } from 'node:crypto';
import type { Actor } from '@/lib/auth/actor';
import { requirePerson } from '@/lib/auth/require-person';
import { invalidField, notFound } from '@/lib/errors';
import { requireCompound } from './require-compound';
import { drawStructureSvg, StructureError } from './structure';

/**
 * The drawing of a compound's structure as an HTTP response: kept by the browser, asked for again by its digest.
 * @throws Problem 404 without a compound or a structure, 422 where the stored SMILES cannot be drawn.
 */
export async function structureResponse(
  actor: Actor,
  id: string,
  size: { width: number; height: number },
  ifNoneMatch: string | null,
): Promise<Response> {
  requirePerson(actor);
  const { smiles, name } = await requireCompound(id);
  if (smiles === null) throw notFound('structure of this compound');
  const svg = await drawStructureSvg(smiles, { ...size, title: `Structure of ${name}` }).catch((error) => {
    throw error instanceof StructureError ? invalidField('smiles', error.message) : error;
  });
  const etag = `"${createHash('sha256').update(svg, 'utf8').digest('hex')}"`;
  const headers = {
    etag,
    'cache-control': 'private, no-cache',
    'content-type': 'image/svg+xml; charset=utf-8',
    'x-content-type-options': 'nosniff',
    'content-security-policy': "default-src 'none'; sandbox",
  };
  const known = ifNoneMatch?.split(',').some((tag) => [etag, '*'].includes(tag.trim().replace(/^W\//, '')));
  return known ? new Response(null, { status: 304, headers }) : new Response(svg, { headers });
}
