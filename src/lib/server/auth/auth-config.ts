import { CredentialsSignin, JWTSessionError, MissingCSRF } from '@auth/core/errors';
import Credentials from '@auth/core/providers/credentials';
import type { FullAuthConfig } from 'auth-astro/src/config';
import { z } from 'zod';
import { config } from '../config';
import { AppError } from '../errors';
import { socketAddress } from '../http/socket-address';
import { log } from '../log';
import { SESSION_SECONDS, signIn, type Opened } from '../usecases/sign-in';
import { signOut } from '../usecases/sign-out';

declare module '@auth/core/types' {
  interface User {
    opened?: Opened;
  }
  interface Session {
    opened?: Opened;
  }
}
declare module '@auth/core/jwt' {
  interface JWT {
    opened?: Opened;
  }
}

/** What visitors bring about themselves: a wrong password, a form without its token, a cookie of another secret. */
const VISITORS_OWN = [CredentialsSignin, MissingCSRF, JWTSessionError];

const credentialsSchema = z.object({ email: z.email().max(254), password: z.string().min(1).max(200) });

/** Tells the sign-in page that it should say "wait" instead of "wrong". */
class TooManyAttempts extends CredentialsSignin {
  override code = 'too-many';
}

async function authorize(given: Partial<Record<string, unknown>>, request: Request) {
  const credentials = credentialsSchema.safeParse(given);
  if (!credentials.success) return null;
  try {
    const opened = await signIn(credentials.data.email, credentials.data.password, socketAddress(request));
    return opened && { id: String(opened.personId), opened };
  } catch (error) {
    if (error instanceof AppError && error.code === 'too-many') throw new TooManyAttempts();
    throw error;
  }
}

/**
 * How people sign in: address and password. The cookie carries only who and which session; everything else, the token
 * version too, is read from the database at every request.
 */
export function authConfig(secret: string): FullAuthConfig {
  return {
    secret,
    prefix: '/api/auth',
    basePath: '/api/auth',
    trustHost: true,
    useSecureCookies: config().publicAddress.protocol === 'https:',
    session: { strategy: 'jwt', maxAge: SESSION_SECONDS },
    pages: { signIn: '/sign-in', error: '/sign-in', signOut: '/account' },
    providers: [Credentials({ credentials: { email: {}, password: {} }, authorize })],
    callbacks: {
      jwt: ({ token, user }) => (user ? { sub: user.id, opened: user.opened } : token),
      session: ({ session, token }) => ({ expires: session.expires, opened: token.opened }),
    },
    events: {
      async signOut(message) {
        const opened = 'token' in message ? message.token?.opened : undefined;
        if (opened) await signOut(opened.sessionId);
      },
    },
    logger: {
      error(error) {
        log[VISITORS_OWN.some((kind) => error instanceof kind) ? 'debug' : 'error'](
          { err: error },
          'sign-in',
        );
      },
      warn: (code) => log.debug({ code }, 'sign-in'),
      debug: () => undefined,
    },
  };
}
