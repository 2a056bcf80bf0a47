import { getSession } from 'auth-astro/server';
import { defineMiddleware } from 'astro:middleware';
import { config } from './lib/server/config';
import { setSecurityHeaders } from './lib/server/http/security-headers';
import { startUp } from './start-up';
import { findSessionPerson } from './lib/server/usecases/find-session-person';

/** Session to person, security headers; nothing else. Who may do what is decided by every page and endpoint itself. */
export const onRequest = defineMiddleware(async (context, next) => {
  await startUp();
  const hasCookie = context.request.headers.get('cookie')?.includes('authjs.session-token');
  const session = hasCookie ? await getSession(context.request) : null;
  context.locals.user = session?.opened ? await findSessionPerson(session.opened) : null;
  context.locals.sessionId = session?.opened?.sessionId ?? null;
  const response = await next();
  setSecurityHeaders(response.headers, {
    signedIn: context.locals.user !== null,
    https: config().publicAddress.protocol === 'https:',
    developing: import.meta.env.DEV,
  });
  return response;
});
