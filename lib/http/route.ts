import type { NextRequest } from 'next/server';
import { z } from 'zod';
import type { Actor, Scope } from '@/lib/auth/actor';
import { currentActor, originOf } from '@/lib/auth/current-actor';
import { Problem } from '@/lib/errors';
import { log } from '@/lib/log';
import { answerOnce } from './answer-once';
import { isUnsafe, requireSameOrigin } from './origin';
import { problemResponse } from './problem-response';
import { readJson, readQuery } from './read-body';

const nothing = z.strictObject({});
type Schema = z.ZodType;

/** What a handler is given: everything parsed, checked and typed. */
export type Call<A, P, Q, B> = {
  actor: A;
  params: P;
  query: Q;
  body: B;
  request: NextRequest;
  requestId: string;
};

/** The facts of one operation: they check the request, and the OpenAPI document is made from them. */
export type RouteFacts<
  A extends 'public' | 'signed-in' = 'public' | 'signed-in',
  P extends Schema = Schema,
  Q extends Schema = Schema,
  B extends Schema = Schema,
> = {
  summary: string;
  /** `public` needs no sign-in; otherwise a session, or a token where its scope allows the action. */
  access?: A;
  /** What an access token must hold to call this; without it tokens are refused. `any`: every valid token. */
  token?: Scope | 'any';
  /** For account and password pages, which must work while a password change is due. */
  whilePasswordChangeDue?: true;
  params?: P;
  query?: Q;
  body?: B;
  /** The handler reads the body itself, as a stream. */
  rawBody?: { contentTypes: string[] };
  status?: number;
  response?: Schema;
  responseType?: string;
};

/** The path without the secrets of links that open something by themselves (32 random bytes as base64url). */
function pathForLog(url: string): string {
  return new URL(url).pathname.replace(/[\w-]{43,}/g, '…');
}

type Empty = z.ZodObject<Record<string, never>>;
type Result = Response | { status?: number; json: unknown; headers?: Record<string, string> };
type NextContext = { params: Promise<Record<string, string | string[] | undefined>> };
export type RouteHandler = ((request: NextRequest, context: NextContext) => Promise<Response>) & {
  facts: RouteFacts;
};

function toResponse(result: Result, facts: Pick<RouteFacts, 'status'>, requestId: string): Response {
  if (result instanceof Response) {
    result.headers.set('x-request-id', requestId);
    return result;
  }
  const headers = {
    'cache-control': 'private, no-cache',
    'x-content-type-options': 'nosniff',
    ...result.headers,
    'x-request-id': requestId,
  };
  const status = result.status ?? facts.status ?? 200;
  if (status === 204) return new Response(null, { status, headers });
  return Response.json(result.json, { status, headers });
}

function requireActor(
  actor: Actor | null,
  facts: Pick<RouteFacts, 'access' | 'token' | 'whilePasswordChangeDue'>,
  request: NextRequest,
): Actor | null {
  if (facts.access === 'public') return actor;
  if (!actor)
    throw new Problem('not-signed-in', 'Sign in, or send a valid token as Authorization: Bearer <token>.');
  if (
    actor.kind === 'token' &&
    facts.token !== 'any' &&
    !(facts.token && actor.scopes.includes(facts.token))
  ) {
    throw new Problem(
      'not-allowed',
      facts.token
        ? `This token has no right "${facts.token}". Ask an administrator for one that has it.`
        : 'Access tokens only send evidence and readings. Sign in as a person for this.',
    );
  }
  if (actor.kind === 'user') {
    requireSameOrigin(request);
    if (actor.mustChangePassword && !facts.whilePasswordChangeDue) {
      throw new Problem(
        'password-change-due',
        'This account still has the password that an administrator gave it. Change it first.',
      );
    }
  }
  return actor;
}

/**
 * The one way in for HTTP: finds the caller, checks origin, parameters, query and body, runs the
 * handler, and turns its value or its error into a response and one log line.
 */
export function route<
  A extends 'public' | 'signed-in' = 'signed-in',
  P extends Schema = Empty,
  Q extends Schema = Empty,
  B extends Schema = z.ZodUndefined,
>(
  facts: RouteFacts<A, P, Q, B> & {
    handle: (
      call: Call<A extends 'public' ? Actor | null : Actor, z.output<P>, z.output<Q>, z.output<B>>,
    ) => Promise<Result>;
  },
): RouteHandler {
  const handler = async (request: NextRequest, context: NextContext): Promise<Response> => {
    const started = performance.now();
    const { requestId } = originOf(request.headers);
    let actor: Actor | null = null;
    let response: Response;
    try {
      actor = requireActor(await currentActor(request.headers), facts, request);
      const given = facts.params ? facts.params.safeParse(await context.params) : undefined;
      if (given && !given.success)
        throw new Problem('not-found', 'There is nothing at this address. Check the code or id in it.');
      const query = readQuery(new URL(request.url), facts.query ?? nothing);
      const { value: body, text } = facts.body
        ? await readJson(request, facts.body)
        : { value: undefined, text: '' };
      const run = async () =>
        toResponse(
          await facts.handle({ actor, params: given?.data ?? {}, query, body, request, requestId } as never),
          facts,
          requestId,
        );
      response =
        actor && isUnsafe(request.method) && !facts.rawBody
          ? await answerOnce(request, actor, text, run)
          : await run();
    } catch (error) {
      response = problemResponse(error, requestId);
    }
    log().info(
      {
        requestId,
        method: request.method,
        path: pathForLog(request.url),
        status: response.status,
        ms: Math.round(performance.now() - started),
        actor: actor ? `${actor.kind}:${actor.name}` : null,
      },
      'request',
    );
    return response;
  };
  return Object.assign(handler, { facts: facts as unknown as RouteFacts });
}
