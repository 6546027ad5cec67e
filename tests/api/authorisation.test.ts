import { readdirSync, readFileSync, statSync } from 'node:fs';
import { join } from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { stopTestServer } from '../support/test-server';
import { type Call, type Caller, callers, matrix, type Row } from './authorisation-matrix';
import { buildWorld, type World } from './authorisation-world';

let world: World;
beforeAll(async () => {
  world = await buildWorld();
}, 60_000);
afterAll(stopTestServer);

function listRouteFiles(folder: string): string[] {
  return readdirSync(folder).flatMap((name) => {
    const path = join(folder, name);
    if (statSync(path).isDirectory()) return listRouteFiles(path);
    return name === 'route.ts' ? [path] : [];
  });
}

/** Every route and method that the app answers, as `GET /api/v1/…`; next-auth's own handler and the answer to unknown addresses apart. */
function listOperations(): string[] {
  return listRouteFiles('app')
    .filter((file) => !file.includes('[...nextauth]') && !file.includes('api/[...path]'))
    .flatMap((file) => {
      // Folders in brackets, such as (public), are no part of the address.
      const path = `/${file
        .replace(/^app\//, '')
        .replace(/\([^/]+\)\//g, '')
        .replace(/\/route\.ts$/, '')}`;
      const found = [...readFileSync(file, 'utf8').matchAll(/^export const (GET|POST|PUT|PATCH|DELETE)\b/gm)];
      return found.map((match) => `${match[1]} ${path}`);
    });
}

async function send(caller: Caller, row: Row, { path, body, ifMatch, raw }: Call): Promise<number> {
  const verb = row.method.toLowerCase() as 'get' | 'post' | 'patch' | 'delete';
  let request = world.agents[caller][verb](path);
  if (ifMatch !== undefined) request = request.set('If-Match', `"${ifMatch}"`);
  if (raw)
    return (await request.set('Content-Type', raw.type).set('X-Filename', raw.name).send(raw.bytes)).status;
  return (await (body === undefined ? request : request.send(body as object))).status;
}

describe('who may do what', () => {
  it('has a row for each route and method, and no row for one that is not there', () => {
    expect(matrix.map((row) => `${row.method} ${row.route}`).sort()).toEqual(listOperations().sort());
  });

  it.each(matrix.map((row) => [`${row.method} ${row.route}`, row] as const))('%s', async (_name, row) => {
    const got: Record<string, number> = {};
    const wanted: Record<string, number> = {};
    for (const [index, caller] of callers.entries()) {
      const status = row.expect[index]!;
      // -1: not asked, because the call would end the session that the next rows need.
      if (status === -1) continue;
      wanted[caller] = status;
      got[caller] = await send(caller, row, await row.call(world));
    }
    expect(got).toEqual(wanted);
  });
});
