const EVERYWHERE = {
  'x-content-type-options': 'nosniff',
  // Links in mails carry tokens in their address: no other site may learn them.
  'referrer-policy': 'same-origin',
  'cross-origin-opener-policy': 'same-origin',
  'cross-origin-resource-policy': 'same-origin',
  'permissions-policy': 'camera=(), geolocation=(), microphone=(), payment=(), usb=(), serial=()',
};

const NO_PAGE = "default-src 'none'; frame-ancestors 'none'; base-uri 'none'; form-action 'none'";

/** The policy of a page. `scripts` are the sources that the build found in it: our own files and hashes of its islands. */
function pagePolicy(scripts: string): string {
  return [
    "default-src 'none'",
    `script-src ${scripts}`,
    // Accessible controls place popovers by style attributes and add one small style element of their own.
    "style-src 'self' 'unsafe-inline'",
    "img-src 'self' data: blob:",
    "font-src 'self'",
    "connect-src 'self'",
    "frame-src 'self'",
    "worker-src 'self' blob:",
    "manifest-src 'self'",
    "form-action 'self'",
    "base-uri 'none'",
    "frame-ancestors 'self'",
  ].join('; ');
}

const scriptSources = (policy: string): string | undefined =>
  /(?:^|;)\s*script-src ([^;]+)/.exec(policy)?.[1].trim();

export interface HeaderCircumstances {
  signedIn: boolean;
  https: boolean;
  /** the development server, whose live reload no policy can describe */
  developing: boolean;
}

function setPolicy(headers: Headers, isPage: boolean, developing: boolean): void {
  if (!isPage) {
    if (!headers.has('content-security-policy')) headers.set('content-security-policy', NO_PAGE);
  } else if (developing) headers.delete('content-security-policy');
  else
    headers.set(
      'content-security-policy',
      pagePolicy(scriptSources(headers.get('content-security-policy') ?? '') ?? "'self'"),
    );
}

/** Sets what every answer carries; a stricter policy that an endpoint set itself stays. */
export function setSecurityHeaders(
  headers: Headers,
  { signedIn, https, developing }: HeaderCircumstances,
): void {
  const isPage = (headers.get('content-type') ?? '').startsWith('text/html');
  for (const [name, value] of Object.entries(EVERYWHERE)) headers.set(name, value);
  if (https) headers.set('strict-transport-security', 'max-age=31536000');
  if (isPage && !headers.has('cache-control'))
    headers.set('cache-control', signedIn ? 'no-store' : 'no-cache');
  setPolicy(headers, isPage, developing);
}
