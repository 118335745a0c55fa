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
  distDir: process.env.NEXT_DIST_DIR ?? '.next',
  turbopack: { root: import.meta.dirname },
};

export default config;
