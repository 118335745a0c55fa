import path from 'node:path';
import { defineConfig } from 'vitest/config';

export default defineConfig({
  resolve: { alias: { '@': path.resolve(import.meta.dirname) } },
  test: {
    include: ['{app,components,db,lib,importers,tests}/**/*.test.{ts,tsx}'],
    exclude: ['tests/e2e/**', 'node_modules/**'],
    environment: 'node',
    maxWorkers: 2,
    testTimeout: 120_000,
    hookTimeout: 240_000,
  },
});
