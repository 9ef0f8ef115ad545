import { fileURLToPath } from 'node:url';
import { defineConfig } from 'vitest/config';

const shared = fileURLToPath(new URL('./shared', import.meta.url));

export default defineConfig({
  resolve: { alias: { '@shared': shared } },
  test: {
    environment: 'node',
    include: ['tests/journeys/**/*.spec.ts'],
    globalSetup: ['tests/journeys/support/serve-demo.ts'],
    // One browser and one server at a time: two cores.
    fileParallelism: false,
    testTimeout: 180_000,
    hookTimeout: 180_000,
  },
});
