import { createClient } from '@libsql/client'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { CylinderView } from '../../utils/custody/cylinderView'
import { TestClient, type Answer } from '../helpers/client'
import { addMember } from '../helpers/firm'
import { openShop, registered, type Shop } from '../helpers/fleet'
import { startServer, type TestServer } from '../helpers/server'

const SESSION_PASSWORD = '5f0a91d7c3e84b26a9d1e07c48b3f6a2'
/** What a browser says when it asks for a page. */
const BROWSER = { 'accept': 'text/html', 'sec-fetch-site': 'none', 'sec-fetch-mode': 'navigate' }
const PAIRS = 200

let server: TestServer
let shop: Shop
let cylinder: CylinderView
let nobody: TestClient

beforeAll(async () => {
  server = await startServer({ env: { NUXT_SESSION_PASSWORD: SESSION_PASSWORD } })
  shop = await openShop(server)
  cylinder = await registered(shop, { stamp: { serial: 'QX77301' } })
  nobody = new TestClient(server.baseUrl)
})
afterAll(() => server?.stop())

function pageOf(client: TestClient, path: string): Promise<Answer<string>> {
  return client.get<string>(path, BROWSER)
}

/** The page of the cylinder, and pages that show people, papers and settings: whatever a person can open. */
function pagesOf(): string[] {
  return [
    '/account', '/firms', '/fleet', '/fleet/register', '/labels', '/log', '/mail', '/now', '/people', '/places', '/pressure-check', '/retests', '/rules', '/scales', '/scan', '/shipments', '/van', '/vans', '/which-cylinder',
    `/c/${cylinder.id}`, `/c/${cylinder.id}/log`, `/c/${cylinder.id}/act/filled`,
  ]
}

const people = () => [shop.admin, shop.warehouse, shop.technician, shop.manager, shop.auditor]

describe('a page', () => {
  it.each(['/sign-in', '/account', '/firms', '/fleet', '/scan', '/c/7k3m9q2tx'])('has the headers that keep it to itself: %s', async (path) => {
    for (const client of [nobody, shop.manager.client]) {
      const { headers } = await pageOf(client, path)
      expect(headers.get('x-powered-by')).toBeNull()
      expect(headers.get('cache-control')).toBe('no-store')
      expect(headers.get('x-content-type-options')).toBe('nosniff')
      expect(headers.get('x-frame-options')).toBe('DENY')
      expect(headers.get('referrer-policy')).toBe('same-origin')
      expect(headers.get('cross-origin-opener-policy')).toBe('same-origin')
      expect(headers.get('permissions-policy')).toMatch(/camera=\(self\).*microphone=\(\)|microphone=\(\).*camera=\(self\)/)
    }
  })

  it('runs no script but its own: each one carries the nonce of this one answer', async () => {
    const nonces = new Set<string>()
    for (const path of ['/account', '/account', `/c/${cylinder.id}`, '/fleet']) {
      const { headers, body } = await pageOf(shop.manager.client, path)
      const policy = new Map((headers.get('content-security-policy') ?? '').split(';').map((line) => {
        const [name = '', ...sources] = line.trim().split(/\s+/)
        return [name, sources]
      }))
      const nonce = policy.get('script-src')?.map(source => /^'nonce-([\w+/=-]{16,})'$/.exec(source)?.[1]).find(found => found !== undefined) ?? ''
      expect(nonce).not.toBe('')
      nonces.add(nonce)
      expect(policy.get('script-src')).not.toContain('\'unsafe-inline\'')
      expect(policy.get('script-src')).not.toContain('\'unsafe-eval\'')
      for (const name of ['object-src', 'base-uri', 'frame-ancestors', 'script-src-attr']) expect(policy.get(name)).toEqual(['\'none\''])
      for (const name of ['default-src', 'connect-src', 'font-src', 'form-action', 'manifest-src', 'worker-src']) expect(policy.get(name)).toEqual(['\'self\''])

      const scripts = [...body.matchAll(/<script\b([^>]*)>/g)].map(match => match[1] ?? '')
      expect(scripts.length).toBeGreaterThan(1)
      expect(scripts.filter(attributes => !attributes.includes(`nonce="${nonce}"`))).toEqual([])
      expect(body).not.toMatch(/<[a-z][^>]*\son(?:click|load|error)=/i)
    }
    expect(nonces.size).toBe(4)
  })

  it('of the API is for no cache and no guess of its type either', async () => {
    for (const path of ['/api/session', '/api/cylinders', '/api/nothing', '/api/health']) {
      const { headers } = await shop.manager.client.get(path)
      expect(headers.get('cache-control')).toBe('no-store')
      expect(headers.get('x-content-type-options')).toBe('nosniff')
      expect(headers.get('x-powered-by')).toBeNull()
    }
  })
})

describe('what a page tells', () => {
  it('is no secret: no password, no hash, no key of a session', async () => {
    const db = createClient({ url: `file:${server.databaseFile}` })
    const column = async (sql: string) => (await db.execute(sql)).rows.map(row => String(row[0]))
    const secrets = [
      SESSION_PASSWORD, ...people().flatMap(person => [person.password, person.client.session]),
      ...await column('SELECT password_hash FROM people WHERE password_hash IS NOT NULL'),
      ...await column('SELECT secret_hash FROM sessions'), ...await column('SELECT token_hash FROM one_time_links'),
    ]
    db.close()
    expect(secrets.length).toBeGreaterThan(20)
    for (const { client } of people()) {
      for (const path of pagesOf()) {
        const { status, body } = await pageOf(client, path)
        expect(status).toBeLessThan(500)
        expect(secrets.filter(secret => body.includes(secret)), path).toEqual([])
        expect(body, path).not.toContain('$scrypt$')
      }
    }
  })

  it('is nobody else\'s email address where the person may not read contacts', async () => {
    const others = people().filter(person => person !== shop.technician).map(person => person.email)
    for (const path of pagesOf()) {
      const { body } = await pageOf(shop.technician.client, path)
      expect(others.filter(email => body.includes(email)), path).toEqual([])
    }
  })

  it('about a cylinder found by a stranger is the firm\'s name and telephone, the same for every code', async () => {
    const known = await pageOf(nobody, `/c/${cylinder.labelCode!.toLowerCase()}`)
    expect(known.status).toBe(200)
    expect(known.body).toContain('Quillfen Cooling')
    expect(known.body).toContain('555-0100')
    const itsOwn = ['QX77301', 'R-22', cylinder.id, 'North shop', 'DOT-4BA', '47.6', '27.5', shop.warehouse.id, 'Wes']
    expect(itsOwn.filter(text => known.body.includes(text))).toEqual([])

    const unknown = await pageOf(nobody, '/c/7k3m9q2tx')
    const plain = (html: string, code: string) => html.replaceAll(code, 'CODE').replaceAll(/nonce="[^"]*"/g, '').replaceAll(/\b\d{13}\b/g, '')
    expect(unknown.status).toBe(200)
    expect(plain(unknown.body, '7k3m9q2tx')).toBe(plain(known.body, cylinder.labelCode!.toLowerCase()))
  })

  it.each(['/fleet', '/people', '/log', '/van', '/account'])('is nothing to a stranger at %s, who is asked to sign in', async (path) => {
    const answer = await pageOf(nobody, path)
    expect(answer.status).toBe(302)
    expect(answer.headers.get('location')).toBe(`/sign-in?next=${path}`)
  })
})

describe('pages drawn at the same time', () => {
  it(`for two people never show one what is the other's, in ${PAIRS} pairs`, async () => {
    const uma = await addMember(shop.admin, 'Uma', ['manager'])
    const ravi = await addMember(shop.admin, 'Ravi', ['auditor'])
    for (let at = 0; at < PAIRS; at += 10) {
      const pairs = await Promise.all(Array.from({ length: 10 }, () => Promise.all([
        pageOf(uma.client, '/account'),
        pageOf(ravi.client, '/account'),
      ])))
      for (const [first, second] of pairs) {
        expect([first.status, second.status]).toEqual([200, 200])
        expect([first.body.includes('Uma'), first.body.includes('Ravi'), first.body.includes(ravi.id)]).toEqual([true, false, false])
        expect([second.body.includes('Ravi'), second.body.includes('Uma'), second.body.includes(uma.id)]).toEqual([true, false, false])
      }
    }
  })
})
