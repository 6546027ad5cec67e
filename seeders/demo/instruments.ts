import type { TokenActor, UserActor } from '@/lib/auth/actor';
import { AccessToken, Instrument } from '@/lib/database/records';
import { createInstrument } from '@/lib/instruments/create-instrument';
import { createToken } from '@/lib/instruments/create-token';
import type { Team } from './people';

async function requireInstrument(admin: UserActor, team: Team, name: string, kind: string, place: string) {
  const found = await Instrument.findOne({ where: { groupId: team.group.id, name } });
  if (found) return found;
  return createInstrument(admin, { group: team.group.id, name, kind, place });
}

/**
 * The instruments of the first group, and the gas chromatograph's token. The token's secret is thrown away: who wants
 * to send files makes a new one.
 */
export async function requireInstruments(admin: UserActor, team: Team): Promise<TokenActor> {
  await requireInstrument(admin, team, 'Refractometer 1 (invented)', 'refractometer', 'bench 3');
  const chromatograph = await requireInstrument(
    admin,
    team,
    'Gas chromatograph 2 (invented)',
    'gas chromatograph',
    'instrument room',
  );
  const name = 'instrument PC';
  const where = { instrumentId: chromatograph.id, name };
  let token: AccessToken | null = await AccessToken.findOne({ where });
  if (!token) {
    const scopes: ('evidence:write' | 'readings:write')[] = ['evidence:write'];
    token = (await createToken(admin, { instrument: chromatograph.id, name, scopes, expiresInDays: 365 }))
      .row;
  }
  return {
    kind: 'token',
    tokenId: token.id,
    name: `${chromatograph.name}, ${name}`,
    instrumentId: chromatograph.id,
    groupId: team.group.id,
    scopes: ['evidence:write'],
    origin: { requestId: 'seeding', address: null, userAgent: 'Heartcut seeder' },
  };
}
