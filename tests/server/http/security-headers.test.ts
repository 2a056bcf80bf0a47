import { describe, expect, it } from 'vitest';
import { setSecurityHeaders } from '@/lib/server/http/security-headers';

const page = { signedIn: false, https: false, developing: false };
const set = (start: Record<string, string>, circumstances = page): Headers => {
  const headers = new Headers(start);
  setSecurityHeaders(headers, circumstances);
  return headers;
};
const HTML = { 'content-type': 'text/html; charset=utf-8' };

describe('setSecurityHeaders', () => {
  it('goes on everything', () => {
    for (const start of [HTML, { 'content-type': 'application/json' }, {}]) {
      expect(Object.fromEntries(set(start))).toMatchObject({
        'x-content-type-options': 'nosniff',
        'referrer-policy': 'same-origin',
        'cross-origin-opener-policy': 'same-origin',
        'cross-origin-resource-policy': 'same-origin',
      });
    }
  });

  it('takes the hashes of a page’s scripts from the build and allows no inline script besides', () => {
    const policy =
      set({
        ...HTML,
        'content-security-policy': "script-src 'self' 'sha256-abc='; style-src 'self' 'sha256-def=';",
      }).get('content-security-policy') ?? '';
    expect(policy).toContain("script-src 'self' 'sha256-abc=';");
    expect(policy).toContain("default-src 'none'");
    expect(/script-src[^;]*unsafe/.test(policy)).toBe(false);
  });

  it('allows only our own files where the build found no script', () => {
    expect(set(HTML).get('content-security-policy')).toContain("script-src 'self';");
  });

  it('allows nothing at all to what is no page, and leaves a stricter policy alone', () => {
    expect(set({ 'content-type': 'image/png' }).get('content-security-policy')).toMatch(
      /^default-src 'none'/,
    );
    expect(
      set({ 'content-type': 'image/png', 'content-security-policy': 'sandbox' }).get(
        'content-security-policy',
      ),
    ).toBe('sandbox');
  });

  it('sets no policy on pages of the development server', () => {
    expect(set(HTML, { ...page, developing: true }).get('content-security-policy')).toBeNull();
  });

  it('asks for https only where the site has it', () => {
    expect(set(HTML).get('strict-transport-security')).toBeNull();
    expect(set(HTML, { ...page, https: true }).get('strict-transport-security')).toBe('max-age=31536000');
  });

  it('lets no page of somebody signed in be kept', () => {
    expect(set(HTML, { ...page, signedIn: true }).get('cache-control')).toBe('no-store');
    expect(set(HTML).get('cache-control')).toBe('no-cache');
    expect(set({ ...HTML, 'cache-control': 'max-age=60' }).get('cache-control')).toBe('max-age=60');
  });
});
