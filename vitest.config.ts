import { defineConfig } from 'vitest/config';

export default defineConfig({
  test: {
    include: ['tests/**/*.test.{ts,tsx}'],
    // Generous: property tests and pseudo-terminals share slow machines.
    testTimeout: 60_000,
  },
});
