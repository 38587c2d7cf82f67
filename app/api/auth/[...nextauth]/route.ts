import NextAuth, { type NextAuthOptions } from 'next-auth';
import Credentials from 'next-auth/providers/credentials';

import { sourceOf } from '@/server/http/answer-route';
import { sessionHours } from '@/server/auth/session-hours';

/** What next-auth may do here: sign in by the three things typed, sign out, and say who is signed in. */
const allowed: Readonly<Record<'GET' | 'POST', readonly string[]>> = {
  GET: ['csrf', 'session', 'providers'],
  POST: ['callback/credentials', 'signout', '_log'],
};

const options: NextAuthOptions = {
  session: { strategy: 'jwt', maxAge: sessionHours * 3600 },
  pages: { signIn: '/sign-in', signOut: '/sign-in', error: '/sign-in' },
  providers: [
    Credentials({
      credentials: { email: {}, password: {}, code: {} },
      async authorize(typed, request) {
        const source = sourceOf(new Headers(request.headers as Record<string, string>));
        const { email = '', password = '', code = '' } = typed ?? {};
        const signedIn = await globalThis.fascicle.execute('sign-in', { email, password, code }, source);
        // next-auth carries the sentence of an error to the form.
        if (!signedIn.isOk) throw new Error(signedIn.body.message);
        return { id: signedIn.body.sessionId };
      },
    }),
  ],
  callbacks: {
    // The token holds the session's id and nothing of the person: roles are asked for at every request.
    jwt: ({ token, user }) => ({ sessionId: user?.id ?? token['sessionId'] }),
    session: ({ session }) => ({ expires: session.expires }),
  },
  events: {
    async signOut({ token }) {
      const sessionId: unknown = token['sessionId'];
      if (typeof sessionId === 'string') await globalThis.fascicle.execute('sign-out', { sessionId }, { cookie: null, authorization: null, address: 'own' });
    },
  },
  logger: { error: () => undefined, warn: () => undefined, debug: () => undefined },
};

type Place = { params: Promise<{ nextauth: string[] }> };

async function handle(request: Request, place: Place): Promise<Response> {
  const action = (await place.params).nextauth.join('/');
  if (!allowed[request.method as 'GET' | 'POST']?.includes(action)) return new Response(null, { status: 404 });
  const answer: unknown = await NextAuth(options)(request, place);
  return answer instanceof Response ? answer : new Response(null, { status: 503 });
}

export { handle as GET, handle as POST };
