import { defineConfig } from 'vitest/config'

// Far from UTC and with a clock change, so that a rule that leans on the machine's own zone is found out.
process.env.TZ = 'Europe/Zurich'

const root = new URL('..', import.meta.url).pathname

// Pure: neither a database nor a browser.
const unit = ['app/**/*.test.ts', 'test/standards/**/*.test.ts', 'test/architecture.test.ts']

export default defineConfig({
  root,
  test: {
    pool: 'forks',
    maxWorkers: 2,
    // Generous, because a machine that is busy with something else is no defect.
    testTimeout: 20_000,
    hookTimeout: 60_000,
    reporters: process.env.CANNULARY_REPORT
      ? ['default', ['json', { outputFile: process.env.CANNULARY_REPORT }]]
      : ['default'],
    projects: [
      {
        extends: true,
        test: { name: 'unit', include: unit, exclude: ['app/**/*.server.test.ts'], setupFiles: ['test/setup.ts'] },
      },
      {
        extends: true,
        test: {
          name: 'node',
          include: ['app/**/*.server.test.ts', 'test/**/*.test.ts'],
          exclude: [...unit.slice(1), 'test/journeys/**', 'test/faults/**'],
          globalSetup: ['test/run/mariadb-for-tests.ts'],
          setupFiles: ['test/setup.ts', 'test/setup-database.ts'],
        },
      },
      {
        extends: true,
        test: {
          name: 'dom',
          include: ['app/**/*.test.tsx', 'test/**/*.test.tsx'],
          environment: 'jsdom',
          setupFiles: ['test/setup.ts', 'test/setup-dom.ts'],
        },
      },
      {
        extends: true,
        test: {
          name: 'journeys',
          include: ['test/journeys/**/*.test.ts', 'test/faults/**/*.test.ts'],
          globalSetup: ['test/run/mariadb-for-tests.ts', 'test/run/built-app.ts'],
          setupFiles: ['test/setup.ts'],
          testTimeout: 120_000,
          hookTimeout: 120_000,
        },
      },
    ],
  },
})
