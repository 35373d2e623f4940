import react from '@vitejs/plugin-react'
import { defineConfig } from 'vitest/config'

const CORE = ['tests/core/**/*.test.ts', 'tests/reference/**/*.test.ts', 'tests/bench/**/*.test.ts']
const WEB = ['tests/web/**/*.test.{ts,tsx}']
const SCRIPTS = ['tests/scripts/**/*.test.{ts,mjs}']
const E2E = ['tests/e2e/**/*.test.ts']

const setupFiles = ['tests/support/fastCheck.ts']

/** These drive whole programs on a machine of two cores: one file at a time, after everything else. */
const wholePrograms = { testTimeout: 180_000, hookTimeout: 300_000, maxWorkers: 1 }

export default defineConfig({
  test: {
    projects: [
      { test: { name: 'core', include: CORE, setupFiles, testTimeout: 30_000, sequence: { groupOrder: 0 } } },
      {
        plugins: [react()],
        test: { name: 'web', include: WEB, setupFiles, environment: 'jsdom', sequence: { groupOrder: 0 } },
      },
      {
        // Whatever is in no other project, so that no test is left out for standing in a new folder.
        test: {
          name: 'node',
          setupFiles,
          include: ['tests/**/*.test.{ts,tsx,mjs}'],
          exclude: [...CORE, ...WEB, ...SCRIPTS, ...E2E],
          globalSetup: ['tests/support/globalSetup.ts'],
          testTimeout: 20_000,
          hookTimeout: 30_000,
          sequence: { groupOrder: 0 },
        },
      },
      { test: { name: 'scripts', include: SCRIPTS, sequence: { groupOrder: 1 }, ...wholePrograms } },
      {
        test: {
          name: 'e2e',
          include: E2E,
          globalSetup: ['tests/support/globalSetup.ts', 'tests/support/buildSetup.ts'],
          sequence: { groupOrder: 2 },
          ...wholePrograms,
        },
      },
    ],
  },
})
