import { headers } from 'next/headers';
import { redirect } from 'next/navigation';
import { notFound as pageNotFound } from 'next/navigation';
import { Problem } from '@/lib/errors';
import type { UserActor } from './actor';
import { currentActor } from './current-actor';

/** The signed-in person of a page; sends nobody to sign-in and a fresh account to its first change. */
export async function requirePageActor(): Promise<UserActor> {
  const given = await headers();
  const actor = await currentActor(given);
  const here = given.get('x-page') ?? '/';
  if (actor?.kind !== 'user') redirect(`/sign-in?next=${encodeURIComponent(here)}`);
  if (actor.mustChangePassword && !here.startsWith('/account/password')) redirect('/account/password');
  return actor;
}

/** Runs a query for a page: what the actor may not see is the page "not found". */
export async function orPageNotFound<T>(query: Promise<T>): Promise<T> {
  try {
    return await query;
  } catch (error) {
    if (error instanceof Problem && error.code === 'not-found') pageNotFound();
    throw error;
  }
}
