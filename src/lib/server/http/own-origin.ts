import { config } from '../config';
import { AppError } from '../errors';

/**
 * Refuses a change that another site's page sent with our cookie. Astro's own check leaves JSON out. A browser always
 * names the origin of a change or its relation to ours; a program that names neither holds no visitor's cookie.
 */
export function requireOwnOrigin(request: Request): void {
  const origin = request.headers.get('origin');
  const site = request.headers.get('sec-fetch-site');
  if (origin !== null) {
    const own = [new URL(request.url).origin, config().publicAddress.origin];
    if (!own.includes(origin)) throw new AppError('cross-site');
  }
  if (site !== null && site !== 'same-origin' && site !== 'none') throw new AppError('cross-site');
}
