import type { Actor } from '@/lib/auth/actor';
import { authorise } from '@/lib/auth/authorise';
import { AccessToken, Group, Instrument } from '@/lib/database/records';
import type { PresentedInstrument, PresentedToken } from './schema';

type TokenWithInstrument = AccessToken & { instrument: Instrument };

export function presentToken(token: TokenWithInstrument): PresentedToken {
  return {
    id: token.id,
    instrument: token.instrumentId,
    instrumentName: token.instrument.name,
    name: token.name,
    hint: token.hint,
    scopes: token.scopes,
    expiresAt: token.expiresAt.toISOString(),
    revokedAt: token.revokedAt?.toISOString() ?? null,
    lastSeenAt: token.lastSeenAt?.toISOString() ?? null,
  };
}

/** All instruments with their group, by name, for administrators. */
export async function listInstruments(actor: Actor): Promise<PresentedInstrument[]> {
  authorise(actor, 'administration.write', null);
  const groups = new Map((await Group.findAll()).map((group) => [group.id, group.name]));
  const instruments = await Instrument.findAll({ order: [['name', 'ASC']], limit: 1000 });
  return instruments.map(({ id, groupId, name, kind, serialNumber, place, version }) => ({
    id,
    group: groupId,
    groupName: groups.get(groupId) ?? '',
    name,
    kind,
    serialNumber,
    place,
    version,
  }));
}

/** All tokens, newest first, without their secrets, which nobody has. */
export async function listTokens(actor: Actor): Promise<PresentedToken[]> {
  authorise(actor, 'administration.write', null);
  const tokens = await AccessToken.findAll({
    include: [{ model: Instrument, as: 'instrument' }],
    order: [['createdAt', 'DESC']],
    limit: 1000,
  });
  return (tokens as TokenWithInstrument[]).map(presentToken);
}
