import type { Role, UserActor } from '@/lib/auth/actor';
import { TrayItem } from '@/lib/database/records';
import type { Page } from '@/lib/http/paging';
import { listWaiting } from './list-waiting';
import type { Waiting } from './queue-schema';

export type WhatWaits = {
  /** Came back to me, with the reason. */
  returned: Page<Waiting>;
  /** Mine, and not submitted yet. */
  open: Page<Waiting>;
  /** For me to look at and sign; null for who may not sign. */
  toSign: Page<Waiting> | null;
  /** Files that wait for their fraction; null for who may not file them. */
  trayCount: number | null;
};

function groupsWith(actor: UserActor, roles: Role[]): string[] {
  const memberships = actor.memberships.filter((one) => roles.includes(one.role));
  return [...new Set(memberships.map((one) => one.groupId))];
}

/** What waits for a person, by role. The first rows of each; the whole is on the pages that are linked. */
export async function findWhatWaits(actor: UserActor): Promise<WhatWaits> {
  const page = { limit: 20 };
  const mine = { groupIds: groupsWith(actor, ['chemist']), collectedById: actor.userId };
  const signing = groupsWith(actor, ['analyst', 'pi']);
  const filing = groupsWith(actor, ['analyst', 'chemist']);
  return {
    returned: await listWaiting(actor, { ...mine, statuses: ['returned'] }, page),
    open: await listWaiting(actor, { ...mine, statuses: ['open', 'reopened'] }, page),
    toSign:
      signing.length > 0
        ? await listWaiting(actor, { groupIds: signing, statuses: ['submitted'] }, page)
        : null,
    trayCount: filing.length > 0 ? await TrayItem.count({ where: { groupId: filing, filedAt: null } }) : null,
  };
}
