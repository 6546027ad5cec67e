import NextAuth from 'next-auth';
import type { NextRequest } from 'next/server';
import { authOptions } from '@/lib/auth/options';

type Context = { params: Promise<{ nextauth: string[] }> };

function handler(request: NextRequest, context: Context): Promise<Response> {
  return NextAuth(request as never, context as never, authOptions()) as Promise<Response>;
}

export { handler as GET, handler as POST };
