import { defineConfig } from 'vitest/config';

const root = new URL('..', import.meta.url).pathname;

export default defineConfig({
  root,
  test: {
    include: ['test/{reference,domain,api}/**/*.test.ts'],
    environment: 'node',
  },
});
