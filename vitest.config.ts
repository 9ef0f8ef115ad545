import { fileURLToPath } from 'node:url';
import { defineConfig } from 'vitest/config';

const shared = fileURLToPath(new URL('./shared', import.meta.url));

export default defineConfig({
  resolve: { alias: { '@shared': shared } },
  test: {
    environment: 'node',
    include: ['{shared,server,migrations,tests}/**/*.spec.ts'],
    exclude: ['tests/journeys/**', 'node_modules/**'],
    testTimeout: 60_000,
    hookTimeout: 60_000,
  },
});
