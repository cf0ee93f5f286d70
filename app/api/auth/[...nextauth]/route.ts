import NextAuth from 'next-auth';
import type { NextRequest } from 'next/server';
import { authOptions } from '@/server/auth/options';
import { environment } from '@/server/environment';

interface Context {
  params: Promise<{ nextauth: string[] }>;
}

async function handle(request: NextRequest, context: Context) {
  // next-auth reads its own address from here and nowhere else.
  process.env.NEXTAUTH_URL ??= environment().publicUrl;
  return NextAuth(request as never, { params: await context.params } as never, authOptions());
}

export { handle as GET, handle as POST };
