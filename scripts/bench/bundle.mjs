// Our own modules as the server has them, in one bundle that finds its packages beside it.
import { mkdir, writeFile } from 'node:fs/promises'
import { join } from 'node:path'
import { fileURLToPath, pathToFileURL } from 'node:url'
import { build } from 'vite'

const here = fileURLToPath(new URL('.', import.meta.url))

/** What a module of this folder exports, with everything of ours that it imports. */
export async function bundled(name) {
  const bundle = await build({
    configFile: false, logLevel: 'warn', root: here, resolve: { alias: { '~~': fileURLToPath(new URL('../..', import.meta.url)) } },
    build: { ssr: name, write: false, minify: false, target: 'node20', rollupOptions: { output: { inlineDynamicImports: true } } },
  })
  const folder = fileURLToPath(new URL('../../node_modules/.cache/collarbook-bench', import.meta.url))
  await mkdir(folder, { recursive: true })
  const path = join(folder, name)
  await writeFile(path, bundle.output[0].code)
  return import(pathToFileURL(path).href)
}
