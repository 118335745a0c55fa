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
    'sharp',
    'tesseract.js',
  ],
  distDir: process.env.NEXT_DIST_DIR ?? '.next',
  turbopack: { root: import.meta.dirname },
};

export default config;
