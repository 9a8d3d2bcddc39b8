import react from '@vitejs/plugin-react'
import { defineConfig } from 'vitest/config'

const alias = { '@': new URL('./src', import.meta.url).pathname }

export default defineConfig({
  test: {
    projects: [
      { test: { name: 'shared', include: ['tests/shared/**/*.test.ts'] } },
      { test: { name: 'reference', include: ['tests/reference/**/*.test.ts'], testTimeout: 60_000 } },
      { test: { name: 'house', include: ['tests/house/**/*.test.ts'], testTimeout: 120_000 } },
      {
        test: {
          name: 'server',
          include: ['tests/server/**/*.test.ts', 'tests/seeds/**/*.test.ts'],
          globalSetup: ['tests/support/global-setup.ts'],
          pool: 'forks',
          testTimeout: 20_000,
          hookTimeout: 60_000,
        },
      },
      // The last two look at what was built and are run by `npm test` after the build.
      { test: { name: 'build', include: ['tests/build/**/*.test.ts'] } },
      {
        test: {
          name: 'e2e',
          include: ['tests/e2e/**/*.test.ts'],
          globalSetup: ['tests/support/e2e-setup.ts'],
          pool: 'forks',
          // The journeys share one server and two processor cores.
          fileParallelism: false,
          sequence: { groupOrder: 1 },
          testTimeout: 120_000,
          hookTimeout: 120_000,
        },
      },
      {
        plugins: [react()],
        resolve: { alias },
        test: {
          name: 'src',
          include: ['tests/src/**/*.test.{ts,tsx}'],
          environment: 'jsdom',
          setupFiles: ['tests/support/client-setup.ts'],
        },
      },
    ],
  },
})
