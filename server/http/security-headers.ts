/** What the policy of one response depends on. */
export interface PolicyFacts {
  readonly nonce: string;
  readonly publicUrl: string;
  readonly isDevelopment: boolean;
}

/** The content policy of one response. Scripts and styles by nonce only; the live channel on the own origin only. */
function contentPolicy({ nonce, publicUrl, isDevelopment }: PolicyFacts): string {
  const channel = publicUrl.replace(/^http/, 'ws');
  const lines: Record<string, string> = {
    'default-src': "'none'",
    // React's development build evaluates code and its hot reload writes styles; neither is ever served in production.
    'script-src': `'nonce-${nonce}' 'strict-dynamic'${isDevelopment ? " 'unsafe-eval'" : ''}`,
    'style-src': isDevelopment ? "'self' 'unsafe-inline'" : `'self' 'nonce-${nonce}'`,
    'img-src': "'self' data: blob:",
    'font-src': "'self'",
    'connect-src': `'self' ${channel}`,
    'worker-src': "'self'",
    'manifest-src': "'self'",
    'form-action': "'self'",
    'frame-ancestors': "'none'",
    'base-uri': "'none'",
    'object-src': "'none'",
  };
  return Object.entries(lines).map(([name, value]) => `${name} ${value}`).join('; ');
}

/** Headers of every response, whoever writes its body. */
export function securityHeaders(facts: PolicyFacts): Readonly<Record<string, string>> {
  return {
    'content-security-policy': contentPolicy(facts),
    'x-content-type-options': 'nosniff',
    'referrer-policy': 'no-referrer',
    'cross-origin-opener-policy': 'same-origin',
    'cross-origin-resource-policy': 'same-origin',
    'permissions-policy': 'camera=(), microphone=(), geolocation=(), payment=(), usb=()',
    'x-frame-options': 'DENY',
    ...(facts.publicUrl.startsWith('https:') ? { 'strict-transport-security': 'max-age=63072000; includeSubDomains' } : {}),
  };
}

/** Whether browsers and proxies may keep a copy: only of the product's own files, never of pages or answers. */
export function mayBeStored(path: string): boolean {
  return path.startsWith('/_next/static/') || /^\/(?:fonts|icons)\//.test(path) || /^\/[a-z0-9-]+\.(?:js|svg|png|ico|webmanifest|woff2)$/.test(path);
}
