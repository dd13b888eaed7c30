// Builds the application where needed and serves the demo firm at http://localhost:3000.
// `npm run demo -- --fresh` makes the demo firm anew; PORT chooses another port.
import { spawn, spawnSync } from 'node:child_process'
import { randomBytes } from 'node:crypto'
import { existsSync, mkdirSync, readdirSync, readFileSync, rmSync, statSync, writeFileSync } from 'node:fs'
import { dirname, join, resolve } from 'node:path'
import { fileURLToPath } from 'node:url'

const root = resolve(dirname(fileURLToPath(import.meta.url)), '..')
process.chdir(root)

const SOURCES = [
  'app.vue', 'error.vue', 'assets', 'components', 'composables', 'drizzle', 'layouts', 'middleware', 'pages', 'plugins',
  'public', 'server', 'stores', 'types', 'utils', 'nuxt.config.ts', 'tailwind.config.ts', 'package-lock.json',
]
const SERVER = join('.output', 'server', 'index.mjs')
const DATABASE = join('data', 'demo.db')
const SECRET = join('data', 'demo-session-password')

function newestChange(path) {
  if (!existsSync(path)) return 0
  const stat = statSync(path)
  if (!stat.isDirectory()) return stat.mtimeMs
  return Math.max(0, ...readdirSync(path).map(name => newestChange(join(path, name))))
}

if (!existsSync(SERVER) || newestChange(SERVER) < Math.max(...SOURCES.map(newestChange))) {
  console.log('Building Collarbook. This takes about a minute.')
  const built = spawnSync(process.execPath, [join('node_modules', 'nuxt', 'bin', 'nuxt.mjs'), 'build'], { stdio: ['ignore', 'inherit', 'inherit'] })
  if (built.status !== 0) process.exit(built.status ?? 1)
}

mkdirSync('data', { recursive: true })
if (process.argv.includes('--fresh')) for (const end of ['', '-wal', '-shm', '.checkpoints']) rmSync(DATABASE + end, { force: true })
if (!existsSync(SECRET)) writeFileSync(SECRET, randomBytes(32).toString('hex'), { mode: 0o600 })

const port = process.env.PORT ?? '3000'
const server = spawn(process.execPath, [SERVER], {
  stdio: 'inherit',
  env: {
    ...process.env,
    NODE_ENV: 'production',
    PORT: port,
    HOST: process.env.HOST ?? 'localhost',
    PUBLIC_URL: process.env.PUBLIC_URL ?? `http://localhost:${port}`,
    DATABASE_URL: process.env.DATABASE_URL ?? `file:./${DATABASE}`,
    NUXT_SESSION_PASSWORD: process.env.NUXT_SESSION_PASSWORD ?? readFileSync(SECRET, 'utf8'),
    COLLARBOOK_DEMO: '1',
  },
})
for (const signal of ['SIGINT', 'SIGTERM']) process.on(signal, () => server.kill(signal))
server.on('exit', code => process.exit(code ?? 0))
