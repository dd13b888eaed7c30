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

// What is pure leaves nothing behind, so that the next file may find its modules read already. The patience is for many cases on a busy machine.
const pure = { isolate: false, testTimeout: 30_000 }
// Each file starts the built server on a database of its own. Mostly one of a test and its server waits for the other, so that two go side by side.
const patience = { testTimeout: 120_000, hookTimeout: 180_000 }
const served = { ...patience, maxWorkers: 2, sequence: { groupOrder: 1 } }
// These want the machine to themselves: browsers, and processes that are killed in the midst of work.
const alone = { ...patience, fileParallelism: false }

export default defineConfig(async () => ({
  test: {
    // Vitest would leave one core out, of two.
    maxWorkers: '100%',
    // Screens looked at side by side: more than this only wait for the processor.
    maxConcurrency: 3,
    projects: [
      nodeProject('architecture'),
      nodeProject('unit', pure),
      nodeProject('reference', pure),
      nodeProject('server', served),
      nodeProject('e2e', alone),
      nodeProject('faults', alone),
      await defineVitestProject({
        resolve: { alias },
        test: {
          name: 'component',
          include: ['tests/component/**/*.test.ts'],
          setupFiles: ['tests/helpers/nothingPutOff.ts', 'tests/helpers/nobodySignedIn.ts'],
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
