import type { World } from './authorisation-world';

/**
 * Who gets which status from each route and method: the readable table of rights as the outside sees
 * it. `foreign` has every role, but in another group; `token` has every scope, in the same group;
 * `revoked` is such a token after it was revoked. Where the allowed answer is a 409 or 422, the call
 * got past the guards and met a rule, which is what this table is about.
 */
export type Caller = 'nobody' | 'chemist' | 'analyst' | 'pi' | 'admin' | 'foreign' | 'token' | 'revoked';
export const callers: Caller[] = [
  'nobody',
  'chemist',
  'analyst',
  'pi',
  'admin',
  'foreign',
  'token',
  'revoked',
];

export type Call = {
  path: string;
  body?: unknown;
  ifMatch?: number;
  raw?: { type: string; bytes: Buffer; name: string };
};
export type Row = {
  route: string;
  method: 'GET' | 'POST' | 'PATCH' | 'DELETE';
  /** Statuses in the order of `callers`. */
  expect: number[];
  /** Makes the request, with whatever records it needs; called anew for each caller. */
  call: (world: World) => Promise<Call> | Call;
};

const everybody = (status: number) => callers.map(() => status);
/** Every signed-in person; an access token only where `token` says so. */
const signedIn = (status: number, token = 403) => [401, status, status, status, status, status, token, 401];
const anyOldText = 'Retention notes, invented for a test.\n';

export const matrix: Row[] = [
  { route: '/api/health', method: 'GET', expect: everybody(200), call: () => ({ path: '/api/health' }) },
  {
    route: '/api/v1/openapi.json',
    method: 'GET',
    expect: everybody(200),
    call: () => ({ path: '/api/v1/openapi.json' }),
  },
  {
    route: '/api/v1/password-resets',
    method: 'POST',
    expect: everybody(202),
    call: () => ({ path: '/api/v1/password-resets', body: { email: 'nobody@heartcut.example' } }),
  },
  {
    route: '/api/v1/password-resets/[token]',
    method: 'POST',
    expect: everybody(422),
    call: () => ({
      path: `/api/v1/password-resets/${'x'.repeat(43)}`,
      body: { newPassword: 'a-long-enough-word' },
    }),
  },
  { route: '/api/v1/me', method: 'GET', expect: signedIn(200, 200), call: () => ({ path: '/api/v1/me' }) },
  {
    route: '/api/v1/account/password',
    method: 'POST',
    expect: [401, 422, 422, 422, 422, 422, 403, 401],
    call: () => ({
      path: '/api/v1/account/password',
      body: { currentPassword: 'wrong', newPassword: 'a-long-enough-word' },
    }),
  },
  {
    // Ends the session that asks, so only those who have none may be tried here.
    route: '/api/v1/account/sign-out-everywhere',
    method: 'POST',
    expect: [401, -1, -1, -1, -1, -1, 403, 401],
    call: () => ({ path: '/api/v1/account/sign-out-everywhere' }),
  },
  {
    route: '/api/v1/audit',
    method: 'GET',
    expect: [401, 403, 403, 200, 200, 200, 403, 401],
    call: () => ({ path: '/api/v1/audit' }),
  },

  // Administration: the flag on the account and nothing else.
  ...(['users', 'groups', 'instruments', 'tokens'] as const).map((what): Row => ({
    route: `/api/v1/admin/${what}`,
    method: 'GET',
    expect: [401, 403, 403, 403, 200, 403, 403, 401],
    call: () => ({ path: `/api/v1/admin/${what}` }),
  })),
  {
    route: '/api/v1/admin/users',
    method: 'POST',
    expect: [401, 403, 403, 403, 201, 403, 403, 401],
    call: ({ word }) => ({
      path: '/api/v1/admin/users',
      body: { email: `${word()}@heartcut.example`, name: 'Somebody' },
    }),
  },
  {
    route: '/api/v1/admin/groups',
    method: 'POST',
    expect: [401, 403, 403, 403, 201, 403, 403, 401],
    call: ({ word }) => ({ path: '/api/v1/admin/groups', body: { name: word() } }),
  },
  {
    route: '/api/v1/admin/instruments',
    method: 'POST',
    expect: [401, 403, 403, 403, 201, 403, 403, 401],
    call: ({ word, group }) => ({
      path: '/api/v1/admin/instruments',
      body: { group: group.id, name: word(), kind: 'gas chromatograph' },
    }),
  },
  {
    route: '/api/v1/admin/tokens',
    method: 'POST',
    expect: [401, 403, 403, 403, 201, 403, 403, 401],
    call: ({ instrumentId }) => ({
      path: '/api/v1/admin/tokens',
      body: { instrument: instrumentId, name: 'PC', scopes: ['evidence:write'] },
    }),
  },
  {
    route: '/api/v1/admin/tokens/[id]',
    method: 'DELETE',
    expect: [401, 403, 403, 403, 204, 403, 403, 401],
    call: async ({ anotherToken }) => ({ path: `/api/v1/admin/tokens/${await anotherToken()}` }),
  },
  {
    route: '/api/v1/admin/users/[id]',
    method: 'GET',
    expect: [401, 403, 403, 403, 200, 403, 403, 401],
    call: ({ people }) => ({ path: `/api/v1/admin/users/${people.chemist.id}` }),
  },
  {
    route: '/api/v1/admin/users/[id]',
    method: 'PATCH',
    expect: [401, 403, 403, 403, 409, 403, 403, 401],
    call: ({ people }) => ({
      path: `/api/v1/admin/users/${people.chemist.id}`,
      ifMatch: 99,
      body: { name: 'Another', reason: 'a test of rights' },
    }),
  },

  // Compounds are shared by the site; a PI of any group writes.
  {
    route: '/api/v1/compounds',
    method: 'GET',
    expect: signedIn(200),
    call: () => ({ path: '/api/v1/compounds' }),
  },
  {
    route: '/api/v1/compounds',
    method: 'POST',
    expect: [401, 403, 403, 201, 403, 201, 403, 401],
    call: ({ word }) => ({ path: '/api/v1/compounds', body: { name: word() } }),
  },
  {
    route: '/api/v1/compounds/[id]',
    method: 'GET',
    expect: signedIn(200),
    call: ({ compound }) => ({ path: `/api/v1/compounds/${compound.id}` }),
  },
  {
    route: '/api/v1/compounds/[id]',
    method: 'PATCH',
    expect: [401, 403, 403, 409, 403, 409, 403, 401],
    call: ({ compound, word }) => ({
      path: `/api/v1/compounds/${compound.id}`,
      ifMatch: 99,
      body: { name: word() },
    }),
  },
  {
    route: '/api/v1/compounds/[id]/structure.svg',
    method: 'GET',
    expect: signedIn(200),
    call: ({ compound }) => ({ path: `/api/v1/compounds/${compound.id}/structure.svg` }),
  },
  {
    route: '/api/v1/compounds/[id]/literature',
    method: 'GET',
    expect: signedIn(200),
    call: ({ compound }) => ({ path: `/api/v1/compounds/${compound.id}/literature` }),
  },
  {
    route: '/api/v1/compounds/[id]/literature',
    method: 'POST',
    expect: [401, 403, 403, 201, 403, 201, 403, 401],
    call: ({ compound }) => ({
      path: `/api/v1/compounds/${compound.id}/literature`,
      body: {
        property: 'refractive index',
        value: 1.3724,
        temperatureC: 20,
        wavelengthNm: 589.3,
        source: 'a test (invented)',
      },
    }),
  },
  {
    route: '/api/v1/compounds/[id]/literature/[valueId]',
    method: 'PATCH',
    expect: [401, 403, 403, 409, 403, 409, 403, 401],
    call: ({ compound, literatureId }) => ({
      path: `/api/v1/compounds/${compound.id}/literature/${literatureId}`,
      ifMatch: 99,
      body: { preferred: true, reason: 'a test of rights' },
    }),
  },
  {
    route: '/api/v1/compounds/[id]/specifications',
    method: 'GET',
    expect: signedIn(200),
    call: ({ compound }) => ({ path: `/api/v1/compounds/${compound.id}/specifications` }),
  },
  {
    // A PI of another group writes for that group, which is what `foreign` does here.
    route: '/api/v1/compounds/[id]/specifications',
    method: 'POST',
    expect: [401, 403, 403, 201, 403, 201, 403, 401],
    call: ({ compound }) => ({
      path: `/api/v1/compounds/${compound.id}/specifications`,
      body: { grade: 'test grade', decisionRule: 'simple', criteria: { refractiveIndexTolerance: 0.0005 } },
    }),
  },
  {
    route: '/api/v1/specifications/[id]/approve',
    method: 'POST',
    expect: [401, 403, 403, 409, 404, 404, 403, 401],
    call: ({ specificationId }) => ({
      path: `/api/v1/specifications/${specificationId}/approve`,
      ifMatch: 99,
    }),
  },

  // Runs and what hangs under them: members of the group read, the role writes, others see nothing.
  {
    route: '/api/v1/runs',
    method: 'GET',
    expect: [401, 200, 200, 200, 200, 200, 403, 401],
    call: () => ({ path: '/api/v1/runs' }),
  },
  {
    route: '/api/v1/runs',
    method: 'POST',
    expect: [401, 201, 403, 403, 403, 422, 403, 401],
    call: ({ compound, group }) => ({
      path: '/api/v1/runs',
      body: {
        targetCompound: compound.id,
        technique: 'simple',
        chargeMassG: 100,
        chargeSource: 'a test (invented)',
        group: group.id,
      },
    }),
  },
  {
    route: '/api/v1/runs/[code]',
    method: 'GET',
    expect: [401, 200, 200, 200, 404, 404, 403, 401],
    call: ({ run }) => ({ path: `/api/v1/runs/${run.code}` }),
  },
  {
    route: '/api/v1/runs/[code]',
    method: 'PATCH',
    expect: [401, 409, 403, 403, 404, 404, 403, 401],
    call: ({ run }) => ({ path: `/api/v1/runs/${run.code}`, ifMatch: 99, body: { note: 'seen' } }),
  },
  {
    route: '/api/v1/runs/[code]/readings',
    method: 'GET',
    expect: [401, 200, 200, 200, 404, 404, 403, 401],
    call: ({ run }) => ({ path: `/api/v1/runs/${run.code}/readings` }),
  },
  {
    route: '/api/v1/runs/[code]/readings',
    method: 'POST',
    expect: [401, 201, 403, 403, 404, 404, 201, 401],
    call: ({ run }) => ({
      path: `/api/v1/runs/${run.code}/readings`,
      body: { readings: [{ at: '2026-11-02T09:00:00Z', headTemperatureC: 77 }] },
    }),
  },
  {
    route: '/api/v1/runs/[code]/fractions',
    method: 'GET',
    expect: [401, 200, 200, 200, 404, 404, 403, 401],
    call: ({ run }) => ({ path: `/api/v1/runs/${run.code}/fractions` }),
  },
  {
    route: '/api/v1/runs/[code]/fractions',
    method: 'POST',
    expect: [401, 201, 403, 403, 404, 404, 403, 401],
    call: ({ run }) => ({ path: `/api/v1/runs/${run.code}/fractions`, body: { cut: 'heart' } }),
  },
  {
    route: '/api/v1/fractions',
    method: 'GET',
    expect: signedIn(200),
    call: () => ({ path: '/api/v1/fractions' }),
  },
  {
    route: '/api/v1/fractions/[code]',
    method: 'GET',
    expect: [401, 200, 200, 200, 404, 404, 403, 401],
    call: ({ fraction }) => ({ path: `/api/v1/fractions/${fraction.code}` }),
  },
  {
    route: '/api/v1/fractions/[code]',
    method: 'PATCH',
    expect: [401, 409, 403, 403, 404, 404, 403, 401],
    call: ({ fraction }) => ({
      path: `/api/v1/fractions/${fraction.code}`,
      ifMatch: 99,
      body: { appearance: 'clear' },
    }),
  },
  {
    route: '/api/v1/fractions/[code]/submit',
    method: 'POST',
    expect: [401, 200, 403, 403, 404, 404, 403, 401],
    call: async ({ freshFraction }) => ({
      path: `/api/v1/fractions/${await freshFraction()}/submit`,
      body: {},
    }),
  },
  {
    route: '/api/v1/fractions/[code]/return',
    method: 'POST',
    expect: [401, 403, 200, 200, 404, 404, 403, 401],
    call: async ({ freshFraction }) => ({
      path: `/api/v1/fractions/${await freshFraction({ status: 'submitted' })}/return`,
      body: { reason: 'weigh again' },
    }),
  },
  {
    // Not signed off for want of evidence: 409 is what one who may sign gets.
    route: '/api/v1/fractions/[code]/sign-off',
    method: 'POST',
    expect: [401, 403, 409, 409, 404, 404, 403, 401],
    call: async ({ freshFraction, password }) => ({
      path: `/api/v1/fractions/${await freshFraction({ status: 'submitted' })}/sign-off`,
      body: { password, meaning: 'reviewed and released for use' },
    }),
  },
  {
    route: '/api/v1/fractions/[code]/reopen',
    method: 'POST',
    expect: [401, 403, 409, 409, 404, 404, 403, 401],
    call: ({ fraction }) => ({
      path: `/api/v1/fractions/${fraction.code}/reopen`,
      body: { reason: 'a test of rights' },
    }),
  },
  {
    route: '/api/v1/fractions/[code]/shares',
    method: 'POST',
    expect: [401, 403, 409, 409, 404, 404, 403, 401],
    call: ({ fraction }) => ({ path: `/api/v1/fractions/${fraction.code}/shares`, body: {} }),
  },
  {
    route: '/api/v1/fractions/[code]/shares',
    method: 'DELETE',
    expect: [401, 403, 404, 404, 404, 404, 403, 401],
    call: ({ fraction }) => ({
      path: `/api/v1/fractions/${fraction.code}/shares?id=01a2314b-2f91-70b5-97bb-3d539facaa78`,
    }),
  },
  {
    route: '/api/v1/fractions/[code]/refractive-readings',
    method: 'GET',
    expect: [401, 200, 200, 200, 404, 404, 403, 401],
    call: ({ fraction }) => ({ path: `/api/v1/fractions/${fraction.code}/refractive-readings` }),
  },
  {
    route: '/api/v1/fractions/[code]/refractive-readings',
    method: 'POST',
    expect: [401, 201, 403, 403, 404, 404, 201, 401],
    call: async ({ freshFraction }) => ({
      path: `/api/v1/fractions/${await freshFraction()}/refractive-readings`,
      body: { readings: [1.3721, 1.3722], temperatureC: 20 },
    }),
  },

  {
    route: '/api/v1/fractions/[code]/shares',
    method: 'GET',
    expect: [401, 403, 200, 200, 404, 404, 403, 401],
    call: ({ fraction }) => ({ path: `/api/v1/fractions/${fraction.code}/shares` }),
  },
  {
    route: '/api/v1/runs/cautions',
    method: 'GET',
    expect: signedIn(200),
    call: ({ compound }) => ({ path: `/api/v1/runs/cautions?compounds=${compound.id}` }),
  },

  // Evidence files.
  {
    route: '/api/v1/evidence',
    method: 'POST',
    expect: [401, 201, 201, 403, 404, 404, 201, 401],
    call: async ({ freshFraction, word }) => ({
      path: `/api/v1/evidence?fraction=${await freshFraction()}`,
      raw: { type: 'text/plain', bytes: Buffer.from(anyOldText + word()), name: 'notes.txt' },
    }),
  },
  {
    route: '/api/v1/evidence/[id]',
    method: 'GET',
    expect: [401, 200, 200, 200, 404, 404, 403, 401],
    call: ({ photoId }) => ({ path: `/api/v1/evidence/${photoId}` }),
  },
  {
    route: '/api/v1/evidence/[id]/content',
    method: 'GET',
    expect: [401, 200, 200, 200, 404, 404, 403, 401],
    call: ({ photoId }) => ({ path: `/api/v1/evidence/${photoId}/content` }),
  },
  {
    route: '/api/v1/evidence/[id]/preview',
    method: 'GET',
    expect: [401, 200, 200, 200, 404, 404, 403, 401],
    call: ({ photoId }) => ({ path: `/api/v1/evidence/${photoId}/preview?width=256` }),
  },

  {
    // The link's token decides, not who asks: what an open link shows is tested with the shared sheet.
    route: '/share/[token]/photo/[evidenceId]',
    method: 'GET',
    expect: everybody(404),
    call: ({ photoId }) => ({ path: `/share/${'x'.repeat(43)}/photo/${photoId}` }),
  },

  // Plates.
  {
    route: '/api/v1/runs/[code]/plates',
    method: 'GET',
    expect: [401, 200, 200, 200, 404, 404, 403, 401],
    call: ({ run }) => ({ path: `/api/v1/runs/${run.code}/plates` }),
  },
  {
    route: '/api/v1/runs/[code]/plates',
    method: 'POST',
    expect: [401, 201, 201, 403, 404, 404, 403, 401],
    call: ({ run, plateBody }) => ({ path: `/api/v1/runs/${run.code}/plates`, body: plateBody }),
  },
  {
    route: '/api/v1/plates/[id]',
    method: 'GET',
    expect: [401, 200, 200, 200, 404, 404, 403, 401],
    call: ({ plateId }) => ({ path: `/api/v1/plates/${plateId}` }),
  },
  {
    route: '/api/v1/plates/[id]',
    method: 'PATCH',
    expect: [401, 409, 409, 403, 404, 404, 403, 401],
    call: ({ plateId }) => ({
      path: `/api/v1/plates/${plateId}`,
      ifMatch: 99,
      body: { eluent: 'hexane / ethyl acetate 9:1' },
    }),
  },

  {
    route: '/api/v1/plates/[id]/profiles',
    method: 'GET',
    // The plate's photo has no corners: past the guards, 422.
    expect: [401, 422, 422, 422, 404, 404, 403, 401],
    call: ({ plateId }) => ({ path: `/api/v1/plates/${plateId}/profiles` }),
  },
  {
    route: '/api/v1/plates/[id]/rectified',
    method: 'GET',
    expect: [401, 422, 422, 422, 404, 404, 403, 401],
    call: ({ plateId }) => ({ path: `/api/v1/plates/${plateId}/rectified` }),
  },
  {
    route: '/api/v1/evidence/[id]/plate-suggestion',
    method: 'POST',
    expect: [401, 200, 200, 403, 404, 404, 403, 401],
    call: ({ photoId }) => ({ path: `/api/v1/evidence/${photoId}/plate-suggestion` }),
  },

  // Traces and integrations.
  {
    route: '/api/v1/evidence/[id]/trace-preview',
    method: 'POST',
    expect: [401, 200, 200, 200, 404, 404, 403, 401],
    call: async ({ freshTraceFile }) => ({
      path: `/api/v1/evidence/${String((await freshTraceFile()).evidenceId)}/trace-preview`,
      body: {},
    }),
  },
  { route: '/api/v1/traces', method: 'GET', expect: signedIn(200), call: () => ({ path: '/api/v1/traces' }) },
  {
    route: '/api/v1/traces',
    method: 'POST',
    expect: [401, 403, 201, 403, 404, 404, 403, 401],
    call: async ({ freshTraceFile }) => ({ path: '/api/v1/traces', body: await freshTraceFile() }),
  },
  {
    route: '/api/v1/traces/[id]',
    method: 'GET',
    expect: [401, 200, 200, 200, 404, 404, 403, 401],
    call: ({ traceId }) => ({ path: `/api/v1/traces/${traceId}` }),
  },
  {
    route: '/api/v1/traces/[id]/points',
    method: 'GET',
    expect: [401, 200, 200, 200, 404, 404, 403, 401],
    call: ({ traceId }) => ({ path: `/api/v1/traces/${traceId}/points?pixels=400` }),
  },
  {
    route: '/api/v1/traces/[id]/integrations',
    method: 'GET',
    expect: [401, 200, 200, 200, 404, 404, 403, 401],
    call: ({ traceId }) => ({ path: `/api/v1/traces/${traceId}/integrations` }),
  },
  {
    route: '/api/v1/traces/[id]/integrations',
    method: 'POST',
    expect: [401, 403, 201, 403, 404, 404, 403, 401],
    call: ({ traceId }) => ({
      path: `/api/v1/traces/${traceId}/integrations`,
      body: { reason: 'a test of rights', parameters: { minimumSignalToNoise: 10 } },
    }),
  },
  {
    route: '/api/v1/integrations/[id]',
    method: 'GET',
    expect: [401, 200, 200, 200, 404, 404, 403, 401],
    call: ({ integrationId }) => ({ path: `/api/v1/integrations/${integrationId}` }),
  },

  // The planner's sums keep nothing, so everybody who is signed in may ask.
  ...(
    [
      ['boiling-point', { normalBoilingPointC: 110.6, associated: false, pressureMbar: 66.66 }],
      ['boiling-pressure', { normalBoilingPointC: 110.6, associated: false, temperatureC: 40 }],
    ] as const
  ).map(([what, body]): Row => ({
    route: `/api/v1/compute/${what}`,
    method: 'POST',
    expect: signedIn(200, 200),
    call: () => ({ path: `/api/v1/compute/${what}`, body }),
  })),
  {
    route: '/api/v1/compute/refractive-index',
    method: 'POST',
    expect: signedIn(200, 200),
    call: ({ compound }) => ({
      path: '/api/v1/compute/refractive-index',
      body: { compound: compound.id, n: 1.372, temperatureC: 21 },
    }),
  },
  {
    route: '/api/v1/compute/separation',
    method: 'POST',
    expect: signedIn(200, 200),
    call: () => ({
      path: '/api/v1/compute/separation',
      body: { light: '108-88-3', heavy: '100-41-4', pressureMbar: 1013.25 },
    }),
  },

  // The tray.
  {
    route: '/api/v1/tray',
    method: 'GET',
    expect: [401, 200, 200, 403, 403, 200, 403, 401],
    call: () => ({ path: '/api/v1/tray' }),
  },
  {
    route: '/api/v1/tray/[id]/file',
    method: 'POST',
    expect: [401, 200, 200, 403, 404, 404, 403, 401],
    call: async ({ freshTrayItem, freshFraction }) => ({
      path: `/api/v1/tray/${await freshTrayItem()}/file`,
      body: { fraction: await freshFraction() },
    }),
  },
];
