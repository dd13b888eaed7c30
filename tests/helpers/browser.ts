import { execFileSync } from 'node:child_process'
import { createReadStream, createWriteStream, existsSync, mkdirSync, renameSync } from 'node:fs'
import { createRequire } from 'node:module'
import { tmpdir } from 'node:os'
import { dirname, join } from 'node:path'
import { pipeline } from 'node:stream/promises'
import { createBrotliDecompress } from 'node:zlib'
import chromium from '@sparticuz/chromium'
import { chromium as driver, type Browser, type BrowserContext, type BrowserContextOptions } from 'playwright-core'

/** What a browser for a test needs to be told. */
export interface BrowserOptions {
  /** A .y4m film that its camera shows. */
  cameraFilm?: string
}

// Without these Chromium looks for its maker's hosts at every start.
const QUIET = [
  '--no-sandbox', '--disable-gpu', '--disable-quic', '--no-first-run', '--disable-background-networking',
  '--disable-component-update', '--disable-sync', '--disable-default-apps',
]

/** A headless Chromium: the one of CHROMIUM_PATH, else the one that comes with the packages. */
export async function launchBrowser({ cameraFilm }: BrowserOptions = {}): Promise<Browser> {
  const executablePath = process.env.CHROMIUM_PATH || await chromium.executablePath()
  const camera = cameraFilm
    ? ['--use-fake-device-for-media-stream', '--use-fake-ui-for-media-stream', `--use-file-for-fake-video-capture=${cameraFilm}`]
    : []
  return driver.launch({ executablePath, args: [...QUIET, ...camera], env: await environmentFor(executablePath) })
}

/** A browser whose profile lies in a folder and outlives it, as a phone's does. */
export async function launchProfile(folder: string, options: BrowserContextOptions = {}): Promise<BrowserContext> {
  const executablePath = process.env.CHROMIUM_PATH || await chromium.executablePath()
  return driver.launchPersistentContext(folder, { executablePath, args: QUIET, env: await environmentFor(executablePath), ...options })
}

/** Ends a browser as a phone does that runs out of power: it gets to do nothing more. */
export async function crash(context: BrowserContext): Promise<void> {
  const ended = new Promise(done => context.once('close', done))
  const session = await context.newCDPSession(await context.newPage())
  session.send('Browser.crash').catch(() => undefined)
  await ended
}

/** A page's console must stay quiet: what it says of errors is gathered here. */
export function listenForErrors(context: BrowserContext): string[] {
  const errors: string[] = []
  context.on('console', (message) => {
    if (message.type() === 'error' || /hydration/i.test(message.text())) errors.push(`${message.text()} (${message.location().url})`)
  })
  context.on('weberror', error => errors.push(String(error.error())))
  return errors
}

/** Where the system has no NSS libraries, the ones that come with the package are unpacked beside the browser. */
async function environmentFor(executablePath: string): Promise<Record<string, string>> {
  const environment = Object.fromEntries(Object.entries(process.env).filter((entry): entry is [string, string] => entry[1] !== undefined))
  if (!missesLibraries(executablePath)) return environment
  const library = join(await unpackedLibraries(), 'lib')
  return { ...environment, LD_LIBRARY_PATH: [library, environment.LD_LIBRARY_PATH].filter(Boolean).join(':') }
}

function missesLibraries(executablePath: string): boolean {
  try {
    return /libn(ss3|spr4)\.so => not found/.test(execFileSync('ldd', [executablePath], { encoding: 'utf8' }))
  }
  catch {
    return false
  }
}

async function unpackedLibraries(): Promise<string> {
  const folder = join(tmpdir(), 'collarbook-chromium-libraries')
  if (existsSync(join(folder, 'lib', 'libnss3.so'))) return folder
  const archive = packagedArchive('al2023.tar.br')
  mkdirSync(folder, { recursive: true })
  const tar = join(folder, `libraries-${process.pid}.tar`)
  await pipeline(createReadStream(archive), createBrotliDecompress(), createWriteStream(tar))
  execFileSync('tar', ['-xf', tar, '-C', folder])
  renameSync(tar, join(folder, 'libraries.tar'))
  return folder
}

/** A file of the browser's package, which does not export its folder. */
function packagedArchive(name: string): string {
  let folder = dirname(createRequire(import.meta.url).resolve('@sparticuz/chromium'))
  while (!existsSync(join(folder, 'bin', name))) {
    if (folder === dirname(folder)) throw new Error(`@sparticuz/chromium holds no ${name}`)
    folder = dirname(folder)
  }
  return join(folder, 'bin', name)
}
