import { spawnSync } from 'node:child_process'
import { readdirSync, readFileSync } from 'node:fs'
import { join } from 'node:path'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { openShop, registered } from '../helpers/fleet'
import { startServer, type TestServer } from '../helpers/server'

/** Loaded into a process first: says of every connection and every name looked up that is not this machine. */
const WATCH = `data:text/javascript,${encodeURIComponent(`
  import net from 'node:net'
  import dns from 'node:dns'
  const own = new Set(['localhost', '127.0.0.1', '::1', undefined])
  const say = host => own.has(host) || console.log('REACHED OUT to ' + host)
  const connect = net.Socket.prototype.connect
  net.Socket.prototype.connect = function (...args) {
    const [first, second] = Array.isArray(args[0]) ? args[0] : args
    say(typeof first === 'object' ? first.host : typeof second === 'string' ? second : undefined)
    return connect.apply(this, args)
  }
  const lookup = dns.lookup
  dns.lookup = function (host, ...rest) { say(host); return lookup.call(this, host, ...rest) }
`)}`

/** Hosts that a library's text names and nothing asks: as the name of a format, in an explanation, or in place of what is set here. */
const NAMED_ONLY: Record<string, string> = {
  'www.w3.org': 'names of SVG and MathML',
  'json-schema.org': 'names of schema versions',
  'vuejs.org': 'where an error of the framework is explained',
  'github.com': 'where a library is at home',
  'bit.ly': 'where a warning of the worker is explained',
  'fastly.jsdelivr.net': 'where the decoder would be fetched; the scanner says to take the one of this server',
}

function filesIn(folder: string, fits: RegExp): string[] {
  return readdirSync(folder, { recursive: true, encoding: 'utf8' }).filter(path => fits.test(path)).map(path => join(folder, path))
}

let server: TestServer
beforeAll(async () => {
  server = await startServer({ env: { NODE_OPTIONS: `--import ${WATCH}` } })
})
afterAll(() => server?.stop())

describe('the running server', () => {
  it('asks nobody else, whatever is set up, recorded, drawn and printed', async () => {
    const shop = await openShop(server)
    const { id, labelCode } = await registered(shop)
    for (const path of ['/fleet', `/c/${id}`, `/c/${id}/act/filled`, '/places', '/shipments', '/retests', '/account', `/api/labels.pdf?codes=${labelCode}&stock=roll-4x2`, '/api/openapi.json']) {
      expect((await shop.manager.client.get(path, { accept: 'text/html, */*' })).status, path).toBe(200)
    }
    expect(server.output()).not.toContain('REACHED OUT')
  })

  it('would be found out: the watch sees a connection and a name', () => {
    const script = `require('node:net').connect(9, '192.0.2.1').on('error', () => {}).destroy(); fetch('http://nowhere.invalid').catch(() => {}); setTimeout(() => process.exit(), 300)`
    const { stdout } = spawnSync(process.execPath, ['-e', script], { env: { ...process.env, NODE_OPTIONS: `--import ${WATCH}` }, encoding: 'utf8' })
    expect(stdout).toContain('REACHED OUT to 192.0.2.1')
    expect(stdout).toContain('REACHED OUT to nowhere.invalid')
  })
})

describe('what a browser is given', () => {
  it('names no host that it could ask, but for those that nothing does', () => {
    const named = filesIn('.output/public', /\.(js|css|html|json|svg|txt|webmanifest)$/).flatMap(path =>
      [...readFileSync(path, 'utf8').matchAll(/\b(?:https?|wss?):\/\/([a-z\d][a-z\d.-]*\.[a-z]{2,})/gi)].map(match => match[1] ?? ''))
    expect(named.length).toBeGreaterThan(0)
    expect([...new Set(named)].map(host => host.replace(/^api\d/, 'api')).filter(host => !Object.hasOwn(NAMED_ONLY, host))).toEqual([])
  })

  it('has the decoder and the fonts with it', () => {
    const files = filesIn('.output/public', /\.(wasm|woff2)$/)
    expect(files.filter(path => /zxing_reader.*\.wasm$/.test(path))).toHaveLength(1)
    expect(files.filter(path => path.endsWith('.woff2')).length).toBeGreaterThan(2)
  })
})
