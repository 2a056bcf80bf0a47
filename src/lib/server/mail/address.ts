import { config } from '../config';

/** An address of the site as people reach it, for links in mails. */
export function siteUrl(path: string, query: Record<string, string> = {}): string {
  const url = new URL(path, config().publicAddress);
  for (const [name, value] of Object.entries(query)) url.searchParams.set(name, value);
  return url.href;
}
