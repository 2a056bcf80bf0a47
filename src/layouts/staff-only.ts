import type { AstroGlobal } from 'astro';
import type { Role } from '@/lib/orders/state';
import { signInFor } from './next-page';

/** The answer to someone for whom a page does not exist: the way to sign in, or the page of nothing. Null where it does. */
export function staffOnly(
  astro: Readonly<AstroGlobal>,
  roles: readonly Role[],
): Response | Promise<Response> | null {
  const { user } = astro.locals;
  if (!user) return astro.redirect(signInFor(astro.url));
  return roles.includes(user.role) ? null : astro.rewrite('/404');
}
