// Makes the caches of the custody log (cylinders, movements, changes of stock, label claims, halves of pairs) again from the log.
import { dirname, resolve } from 'node:path'
import { fileURLToPath } from 'node:url'
import { createJiti } from 'jiti'

const root = resolve(dirname(fileURLToPath(import.meta.url)), '..')
const jiti = createJiti(import.meta.url, { alias: { '~~': root } })
const { runRebuild } = await jiti.import('../server/utils/custody/runRebuild.ts')
await runRebuild(process.env.DATABASE_URL ?? 'file:./data/collarbook.db', resolve(root, 'drizzle/migrations'))
