/**
 * What a page may load and run. Scripts need the page's nonce; styles may stand in the page,
 * because the grid and the charts write them there; WebAssembly is for reading photos on the
 * device; nothing comes from or goes to another origin.
 */
export function contentSecurityPolicy(page: {
  readonly nonce: string;
  readonly isHttps: boolean;
  /** The framework's development build evaluates strings. */
  readonly isDevelopment: boolean;
}): string {
  const scripts = [
    "'self'",
    `'nonce-${page.nonce}'`,
    "'strict-dynamic'",
    "'wasm-unsafe-eval'",
    ...(page.isDevelopment ? ["'unsafe-eval'"] : []),
  ];
  const directives = [
    "default-src 'self'",
    `script-src ${scripts.join(' ')}`,
    "style-src 'self' 'unsafe-inline'",
    "img-src 'self' blob: data:",
    "font-src 'self'",
    "connect-src 'self'",
    "worker-src 'self'",
    "manifest-src 'self'",
    "object-src 'none'",
    "base-uri 'none'",
    "form-action 'self'",
    "frame-ancestors 'none'",
    ...(page.isHttps ? ['upgrade-insecure-requests'] : []),
  ];
  return directives.join('; ');
}
