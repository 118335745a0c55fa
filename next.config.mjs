/** For every answer; a page's content security policy needs a nonce and is set in proxy.ts. */
const everywhere = [
  { key: 'X-Content-Type-Options', value: 'nosniff' },
  { key: 'Referrer-Policy', value: 'same-origin' },
  { key: 'Permissions-Policy', value: 'camera=(self), microphone=(), geolocation=(), payment=()' },
  { key: 'Cross-Origin-Opener-Policy', value: 'same-origin' },
  { key: 'Cross-Origin-Resource-Policy', value: 'same-origin' },
];

/** The API's answers are data: as a page none of them may do anything. */
const inApi = [
  { key: 'Content-Security-Policy', value: "default-src 'none'; frame-ancestors 'none'" },
];

/** @type {import('next').NextConfig} */
const config = {
  poweredByHeader: false,
  reactStrictMode: true,
  devIndicators: false,
  experimental: { authInterrupts: true },
  serverExternalPackages: [
    '@electric-sql/pglite',
    '@node-rs/argon2',
    'pg',
    'pino',
    // Loads drizzle's operators by a computed name, which no bundler can follow.
    'rate-limiter-flexible',
    'sharp',
    'tesseract.js',
  ],
  headers: async () => [
    { source: '/:path*', headers: everywhere },
    { source: '/api/:path*', headers: inApi },
  ],
  distDir: process.env.NEXT_DIST_DIR ?? '.next',
  turbopack: { root: import.meta.dirname },
};

export default config;
