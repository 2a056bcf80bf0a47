/** Where to go on after signing in: a page of this site, else the fallback. Another site's address is never followed. */
export function nextPage(url: URL, fallback: string): string {
  const next = url.searchParams.get('next');
  if (next === null || !next.startsWith('/') || /^\/[/\\]/.test(next) || [...next].some((sign) => sign < ' '))
    return fallback;
  return next;
}

/** The sign-in page that leads back to where the person was heading. */
export function signInFor(url: URL): string {
  return `/sign-in?${new URLSearchParams({ next: url.pathname + url.search })}`;
}
