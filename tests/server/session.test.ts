import { setTimeout as wait } from 'node:timers/promises'
import { createClient } from '@libsql/client'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { ProblemDetails } from '../../utils/contract/problem'
import { TestClient } from '../helpers/client'
import { addMember, ADMIN, PASSWORD, setUpFirm, type Member } from '../helpers/firm'
import { startServer, type TestServer } from '../helpers/server'

let server: TestServer
let admin: Member
let tech: Member

beforeAll(async () => {
  // Callers are told apart by what our proxy says of them, so that one test does not slow the next.
  server = await startServer({ env: { PROXY_HOPS: '1' }, dearPasswords: true })
  admin = await setUpFirm(server)
  tech = await addMember(admin, 'Tess', ['technician'])
})
afterAll(() => server?.stop())

/** A browser that holds a given sealed session. */
function holding(session: string): TestClient {
  const client = new TestClient(server.baseUrl)
  client.cookies.set('collarbook', session)
  return client
}

/** Tries to sign in from an address. */
function from(address: string, email: string, password: string) {
  return new TestClient(server.baseUrl).post('/api/session', { email, password }, { 'x-forwarded-for': address })
}

async function signedIn(member: Member): Promise<TestClient> {
  const client = new TestClient(server.baseUrl)
  expect((await client.signIn(member.email, member.password)).status).toBe(200)
  return client
}

/** Writes to the database behind the server's back. */
async function inDatabase(sql: string, args: (string | number)[] = []) {
  const database = createClient({ url: `file:${server.databaseFile}`, timeout: 5000 })
  try {
    return (await database.execute({ sql, args })).rows
  }
  finally {
    database.close()
  }
}

async function status(client: TestClient): Promise<number> {
  return (await client.get('/api/session')).status
}

describe('signing in', () => {
  it('answers who one is, and nothing of the password', async () => {
    const answer = await new TestClient(server.baseUrl).signIn(' Tess@Harbor.example ', PASSWORD)
    expect(answer.body).toEqual({
      user: { id: tech.id, name: 'Tess', email: 'tess@harbor.example', roles: ['technician'], trainee: false, certification: null, certificationType: null, certificationNumber: null, units: 'lb' },
    })
  })

  it('sets one sealed cookie that scripts and other sites do not get', async () => {
    const answer = await new TestClient(server.baseUrl).signIn(tech.email, PASSWORD)
    const cookies = answer.headers.getSetCookie()
    expect(cookies).toHaveLength(1)
    expect(cookies[0]).toMatch(/^collarbook=Fe26\.2\*.*; Path=\/; Expires=[^;]+; HttpOnly; SameSite=Lax$/)
  })

  it('says the same in nearly the same time to a wrong password, an unknown address, one not yet taken up and one turned off', async () => {
    await admin.client.post('/api/people', { name: 'Ira', email: 'ira@harbor.example', roles: ['auditor'] })
    const off = await addMember(admin, 'Olga', ['warehouse'])
    await admin.client.patch(`/api/people/${off.id}`, { active: false })
    const tries = [tech.email, 'nobody@harbor.example', 'ira@harbor.example', off.email]
    const seen = []
    for (const email of tries) {
      const times = []
      let answer
      for (let round = 0; round < 2; round++) {
        const start = performance.now()
        answer = await from('203.0.113.1', email, email === off.email ? PASSWORD : 'not-the-password')
        times.push(performance.now() - start)
      }
      seen.push({ answer, time: Math.min(...times) })
    }
    for (const { answer } of seen) {
      expect(answer?.status).toBe(401)
      expect(answer?.body).toEqual(seen[0]?.answer?.body)
      expect(answer?.headers.getSetCookie()).toEqual([])
    }
    const times = seen.map(({ time }) => time)
    // Without the work for nothing an unknown address would answer some hundred times faster.
    expect(Math.max(...times) / Math.min(...times)).toBeLessThan(3)
  })

  it('is refused malformed, not as wrong, without a password', async () => {
    const answer = await new TestClient(server.baseUrl).post<ProblemDetails>('/api/session', { email: tech.email })
    expect(answer.status).toBe(400)
    expect(answer.body.errors?.[0]?.path).toBe('password')
  })

  it('has to wait after five failures from one address, told in seconds', async () => {
    const email = 'guessed@harbor.example'
    // All at once: a try counts from its beginning, and the wait of a second would pass while a busy machine answers one by one.
    // What a caller writes before our proxy's word does not make it another caller.
    const tries = await Promise.all(Array.from({ length: 7 }, (_, n) => from(n % 2 === 0 ? '203.0.113.2' : '198.51.100.7, 203.0.113.2', email, `guess-${n}`)))
    expect(tries.map(one => one.status).sort()).toEqual([401, 401, 401, 401, 401, 429, 429])
    for (const refused of tries.filter(one => one.status === 429)) expect(refused.headers.get('retry-after')).toBe('1')
    expect((await from('203.0.113.3', email, 'guess-7')).status).toBe(401)
  })

  it('answers 429 instead of hashing a crowd', async () => {
    const crowd = await Promise.all(Array.from({ length: 30 }, (_, n) => from(`203.0.113.${100 + n}`, `crowd${n}@harbor.example`, 'x')))
    const refused = crowd.filter(({ status: answered }) => answered === 429)
    // Two are hashed and sixteen wait; while they do, some of the rest may find a place.
    expect(refused.length).toBeGreaterThan(0)
    expect(refused.length).toBeLessThanOrEqual(12)
    expect(crowd.filter(({ status: answered }) => answered === 401)).toHaveLength(30 - refused.length)
    for (const { headers } of refused) expect(headers.get('retry-after')).toBe('5')
  })

  it('writes who, when and from where, and never what was typed', async () => {
    const rows = await inDatabase('select what, person_id, subject from security_log')
    expect(rows).toContainEqual(expect.objectContaining({ what: 'signed-in', person_id: tech.id }))
    expect(rows).toContainEqual(expect.objectContaining({ what: 'sign-in-refused', person_id: tech.id }))
    expect(JSON.stringify(rows)).not.toMatch(/guess-|not-the-password|brazed-joint/)
  })
})

describe('the sealed cookie', () => {
  it('is worth nothing after sign-out, even when kept', async () => {
    const client = await signedIn(tech)
    const kept = client.session
    expect(await status(holding(kept))).toBe(200)
    expect((await client.delete('/api/session')).status).toBe(204)
    expect(client.session).toBe('')
    expect(await status(holding(kept))).toBe(401)
  })

  it('planted before sign-in gives its planter nothing: the sign-in has a secret of its own', async () => {
    const attacker = await signedIn(admin)
    const planted = attacker.session
    const victim = holding(planted)
    await victim.signIn(tech.email, PASSWORD)
    expect(victim.session).not.toBe(planted)
    expect((await victim.get<{ user: { id: string } }>('/api/session')).body.user.id).toBe(tech.id)
    // The planted one ended with the sign-in; it did not become the victim's.
    expect(await status(holding(planted))).toBe(401)
  })

  it('brings back no former session, however often one signs in on one browser', async () => {
    const client = await signedIn(tech)
    const seals = [client.session]
    for (let n = 0; n < 2; n++) {
      await client.signIn(tech.email, PASSWORD)
      seals.push(client.session)
    }
    expect(await Promise.all(seals.map(seal => status(holding(seal))))).toEqual([401, 401, 200])
    const rows = await inDatabase('select secret_hash from sessions')
    for (const { secret_hash } of rows) expect(secret_hash).toMatch(/^[0-9a-f]{64}$/)
  })

  it('is good for 30 days from this sign-in, not from an earlier one on the same browser', async () => {
    const client = await signedIn(tech)
    await wait(1100)
    const before = Math.floor(Date.now() / 1000) * 1000
    const [cookie = ''] = (await client.signIn(tech.email, PASSWORD)).headers.getSetCookie()
    const expires = Date.parse(/Expires=([^;]+)/.exec(cookie)?.[1] ?? '')
    expect(expires - before).toBeGreaterThanOrEqual(30 * 86_400_000)
    expect(expires - before).toBeLessThan(30 * 86_400_000 + 30_000)
  })

  it('does not open when one character of it is changed', async () => {
    const client = await signedIn(tech)
    const { session } = client
    const at = Math.floor(session.length / 2)
    expect(await status(holding(session.slice(0, at) + (session[at] === 'A' ? 'B' : 'A') + session.slice(at + 1)))).toBe(401)
    expect(await status(holding('Fe26.2**nonsense'))).toBe(401)
  })

  it('is not taken from a header', async () => {
    const { session } = await signedIn(tech)
    const bare = new TestClient(server.baseUrl)
    for (const name of ['x-collarbook-session', 'x-nuxt-session-session', 'x-__host-collarbook-session']) {
      expect((await bare.get('/api/session', { [name]: session })).status).toBe(401)
    }
  })

  it('ends 7 days without use for a technician, 12 hours for an admin', async () => {
    const hour = 3_600_000
    const clients = { tech: await signedIn(tech), admin: await signedIn(admin) }
    await inDatabase('update sessions set last_seen_at = ?', [Date.now() - 13 * hour])
    expect(await status(clients.tech)).toBe(200)
    expect(await status(clients.admin)).toBe(401)
    await inDatabase('update sessions set last_seen_at = ?', [Date.now() - 169 * hour])
    expect(await status(clients.tech)).toBe(401)
    await admin.client.signIn(ADMIN.email, ADMIN.password)
  })

  it('is not set for whoever only looks: health, a page of ours, a static file', async () => {
    for (const path of ['/api/health', '/api/firm/card', '/logo.svg']) {
      expect((await new TestClient(server.baseUrl).get(path)).headers.getSetCookie()).toEqual([])
    }
    // A page may keep how one likes to read it; that is no session.
    const page = await new TestClient(server.baseUrl).get('/sign-in')
    expect(page.headers.getSetCookie().filter(line => line.includes('Fe26.') || line.startsWith('collarbook='))).toEqual([])
  })

  it('marks the time of use at most once a minute', async () => {
    const client = await signedIn(tech)
    const seen = async () => (await inDatabase('select max(last_seen_at) as at from sessions'))[0]?.at
    const lately = Date.now() - 50_000
    await inDatabase('update sessions set last_seen_at = ?', [lately])
    await status(client)
    // It is written beside the answer: time enough to find it, had it been written.
    await wait(500)
    expect(await seen()).toBe(lately)
    const longAgo = Date.now() - 60_000
    await inDatabase('update sessions set last_seen_at = ?', [longAgo])
    await status(client)
    await expect.poll(seen).toBeGreaterThan(longAgo)
  })
})

describe('what ends the sessions of a person at once', () => {
  it('a change of role', async () => {
    const mona = await addMember(admin, 'Mona', ['technician'])
    await admin.client.patch(`/api/people/${mona.id}`, { roles: ['warehouse'] })
    expect(await status(mona.client)).toBe(401)
    const again = await signedIn(mona)
    await admin.client.patch(`/api/people/${mona.id}`, { name: 'Mona Reyes' })
    expect(await status(again)).toBe(200)
  })

  it('turning the person off; and they cannot sign in', async () => {
    const paul = await addMember(admin, 'Paul', ['manager'])
    await admin.client.patch(`/api/people/${paul.id}`, { active: false })
    expect(await status(paul.client)).toBe(401)
    expect((await new TestClient(server.baseUrl).signIn(paul.email, paul.password)).status).toBe(401)
    await admin.client.patch(`/api/people/${paul.id}`, { active: true })
    expect(await status(paul.client)).toBe(401)
    expect((await new TestClient(server.baseUrl).signIn(paul.email, paul.password)).status).toBe(200)
  })

  it('another password: every browser but the one that changed it, whose seal is new as well', async () => {
    const nina = await addMember(admin, 'Nina', ['technician'])
    const other = await signedIn(nina)
    const former = nina.client.session
    const wrong = await nina.client.post<ProblemDetails>('/api/session/password', { current: 'not-mine', next: 'green-hose-on-left' })
    expect(wrong.status).toBe(403)
    const weak = await nina.client.post<ProblemDetails>('/api/session/password', { current: PASSWORD, next: 'password12345' })
    expect(weak.body).toMatchObject({ status: 422, errors: [{ path: 'next' }] })
    const short = await nina.client.post<ProblemDetails>('/api/session/password', { current: PASSWORD, next: 'green-hose1' })
    expect(short.status).toBe(400)
    expect((await nina.client.post('/api/session/password', { current: PASSWORD, next: 'green-hose-on-left' })).status).toBe(200)
    expect(await status(nina.client)).toBe(200)
    expect(await status(other)).toBe(401)
    expect(await status(holding(former))).toBe(401)
    expect((await new TestClient(server.baseUrl).signIn(nina.email, PASSWORD)).status).toBe(401)
  })
})

describe('guessing with a borrowed session', () => {
  it('has to wait after five wrong present passwords', async () => {
    const rita = await addMember(admin, 'Rita', ['technician'])
    const guess = (n: number) => rita.client.post('/api/session/password', { current: `guess-${n}`, next: 'green-hose-on-left' })
    const tries = await Promise.all(Array.from({ length: 6 }, (_, n) => guess(n)))
    expect(tries.map(one => one.status).sort()).toEqual([403, 403, 403, 403, 403, 429])
  })
})

describe('one\'s own units', () => {
  it('are changed by oneself and stay', async () => {
    const client = await signedIn(tech)
    expect((await client.patch('/api/session/units', { units: 'lb-oz' })).body).toMatchObject({ user: { units: 'lb-oz' } })
    expect((await client.get('/api/session')).body).toMatchObject({ user: { units: 'lb-oz' } })
    expect((await client.patch('/api/session/units', { units: 'stone' })).status).toBe(400)
    expect((await client.patch('/api/session/units', { units: 'kg', roles: ['admin'] })).status).toBe(400)
  })
})
