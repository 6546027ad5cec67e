import type { NextAuthOptions } from 'next-auth';
import CredentialsProvider from 'next-auth/providers/credentials';
import { env } from '@/lib/env';
import { signIn } from '@/lib/accounts/sign-in';
import { isId, newId } from '@/lib/database/ids';
import { endSession, sessionSeconds } from './ended-sessions';

/**
 * Built on each call, since the public address is only known once the server listens (tests take a
 * free port). The session token carries the account's id and session version and nothing else that
 * matters: rights are read from the database on each request.
 */
export function authOptions(): NextAuthOptions {
  return {
    secret: env().authSecret,
    session: { strategy: 'jwt', maxAge: sessionSeconds },
    pages: { signIn: '/sign-in', error: '/sign-in' },
    providers: [
      CredentialsProvider({
        name: 'Heartcut',
        credentials: { email: { type: 'email' }, password: { type: 'password' } },
        async authorize(credentials, request) {
          const forwarded = request?.headers?.['x-forwarded-for'];
          const address = typeof forwarded === 'string' ? (forwarded.split(',')[0]?.trim() ?? null) : null;
          return signIn(credentials?.email ?? '', credentials?.password ?? '', address);
        },
      }),
    ],
    callbacks: {
      jwt({ token, user }) {
        if (user) {
          const account = user as unknown as { id: string; sessionVersion: number };
          token.sub = account.id;
          token.sessionVersion = account.sessionVersion;
          token.sessionId = newId();
        }
        return token;
      },
      session({ session, token }) {
        return Object.assign(session, {
          userId: token.sub,
          sessionVersion: token.sessionVersion,
          sessionId: token.sessionId,
        });
      },
    },
    events: {
      async signOut({ token }) {
        if (typeof token?.sessionId === 'string' && isId(token.sessionId)) await endSession(token.sessionId);
      },
    },
    logger: { error: () => undefined, warn: () => undefined, debug: () => undefined },
  };
}
