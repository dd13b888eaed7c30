import { fileURLToPath } from 'node:url'
import { defineVitestProject } from '@nuxt/test-utils/config'
import { defineConfig } from 'vitest/config'

const root = fileURLToPath(new URL('.', import.meta.url))
const alias = { '~~': root, '~': root }

/** A project that runs in plain Node on the files of one folder of tests/. */
function nodeProject(name: string, more: Record<string, unknown> = {}) {
  return {
    resolve: { alias },
    test: { name, include: [`tests/${name}/**/*.test.ts`], environment: 'node' as const, ...more },
  }
}

// The built server is started once for these; each file brings its own database.
const served = { testTimeout: 120_000, hookTimeout: 180_000, fileParallelism: false }

export default defineConfig(async () => ({
  test: {
    // Screens looked at side by side: more than this only wait for the processor.
    maxConcurrency: 3,
    projects: [
      nodeProject('architecture'),
      nodeProject('unit'),
      nodeProject('reference'),
      nodeProject('server', served),
      nodeProject('e2e', served),
      nodeProject('faults', served),
      await defineVitestProject({
        resolve: { alias },
        test: {
          name: 'component',
          include: ['tests/component/**/*.test.ts'],
          setupFiles: ['tests/helpers/nobodySignedIn.ts'],
          // The framework's own start belongs to the first file's set-up.
          hookTimeout: 60_000,
          // The first page of a file is mounted along with all that it imports, which a busy machine takes its time over.
          testTimeout: 30_000,
          environment: 'nuxt',
          environmentOptions: { nuxt: { domEnvironment: 'happy-dom' } },
        },
      }),
    ],
  },
}))
