import { createClient } from '@libsql/client'
import { existsSync } from 'node:fs'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { TestClient } from '../helpers/client'
import { ADMIN } from '../helpers/firm'
import { refusedStart, startServer, type TestServer } from '../helpers/server'

let server: TestServer

beforeAll(async () => {
  server = await startServer({ dearPasswords: true })
})
afterAll(() => server?.stop())

function request(token: string, change: Record<string, unknown> = {}) {
  return { token, firm: { name: 'Quillfen Cooling', telephone: '555-0100', timeZone: 'America/Chicago', units: 'lb' }, admin: ADMIN, ...change }
}

describe('setting up', () => {
  it('tells nobody anything before it is done', async () => {
    const client = new TestClient(server.baseUrl)
    expect((await client.get('/api/firm/card')).status).toBe(404)
    expect((await client.get('/api/people')).status).toBe(401)
    expect((await client.signIn(ADMIN.email, ADMIN.password)).status).toBe(401)
  })

  it('is open only to the printed link', async () => {
    const client = new TestClient(server.baseUrl)
    expect((await client.get(`/api/setup?token=${server.setUpToken()}`)).body).toMatchObject({ open: true })
    expect((await client.get(`/api/setup?token=${'A'.repeat(43)}`)).status).toBe(404)
    expect((await client.get('/api/setup')).status).toBe(400)
    expect((await client.post('/api/setup', request('A'.repeat(43)))).status).toBe(404)
  })

  it('prints a new link at the next start, and the one before is ended', async () => {
    const former = server.setUpToken()
    await server.restart()
    const tokens = [...server.output().matchAll(/setup\?token=([\w-]{43})/g)].map(match => match[1])
    expect(tokens).toHaveLength(2)
    const client = new TestClient(server.baseUrl)
    expect((await client.get(`/api/setup?token=${former}`)).status).toBe(404)
    expect((await client.get(`/api/setup?token=${tokens[1]}`)).status).toBe(200)
  })

  it('makes one firm and one admin, once, even when sent twice at the same moment', async () => {
    const token = [...server.output().matchAll(/setup\?token=([\w-]{43})/g)].at(-1)?.[1] ?? ''
    const client = new TestClient(server.baseUrl)
    expect((await client.post('/api/setup', request(token, { admin: { ...ADMIN, password: 'password1234' } }))).status).toBe(422)
    expect((await client.post('/api/setup', request(token, { firm: { name: 'H', telephone: '1', timeZone: 'Mars/Base', units: 'lb' } }))).status).toBe(400)
    const both = await Promise.all([client, new TestClient(server.baseUrl)].map(one => one.post('/api/setup', request(token))))
    expect(both.map(({ status }) => status).sort()).toEqual([201, 404])
    const database = createClient({ url: `file:${server.databaseFile}`, timeout: 5000 })
    const counted = await database.execute('select (select count(*) from firm) as firms, (select count(*) from people) as people, (select password_hash from people) as hash, (select token_hash from one_time_links where used_at is not null) as link')
    database.close()
    expect(counted.rows[0]).toMatchObject({ firms: 1, people: 1 })
    // scrypt, N = 2^17, r = 8, p = 1 (OWASP Password Storage Cheat Sheet)
    expect(counted.rows[0]?.hash).toMatch(/^\$scrypt\$n=131072,r=8,p=1\$/)
    expect(counted.rows[0]?.link).not.toContain(token)
    expect((await new TestClient(server.baseUrl).signIn(ADMIN.email, ADMIN.password)).status).toBe(200)
  })

  it('then tells a finder whom to ring, and nothing else', async () => {
    const client = new TestClient(server.baseUrl)
    expect((await client.get('/api/firm/card')).body).toEqual({ name: 'Quillfen Cooling', telephone: '555-0100' })
    expect((await client.get('/api/firm')).status).toBe(401)
    await client.signIn(ADMIN.email, ADMIN.password)
    expect((await client.get('/api/firm')).body).toEqual({
      name: 'Quillfen Cooling', telephone: '555-0100', timeZone: 'America/Chicago', units: 'lb', address: null, emergencyTelephone: null, emergencyContract: null,
    })
    expect((await client.patch('/api/firm', { telephone: '555-0101' })).body).toMatchObject({ telephone: '555-0101' })
  })

  it('is not offered again', async () => {
    const printed = server.output().length
    await server.restart()
    expect(server.output().slice(printed)).not.toContain('token=')
  })
})

describe('a start that must not be', () => {
  it('names the setting that is wrong and ends', async () => {
    const { code, output } = await refusedStart({ NUXT_SESSION_PASSWORD: 'short', DATABASE_URL: 'http://db.example' })
    expect(code).toBe(1)
    expect(output).toMatch(/Collarbook cannot start: .*DATABASE_URL.*NUXT_SESSION_PASSWORD/)
    expect(output).not.toContain('short ')
  })

  it('is refused on a database file that another server holds', async () => {
    const { code, output } = await refusedStart({ DATABASE_URL: `file:${server.databaseFile}` })
    expect(code).toBe(1)
    expect(output).toContain('Another process is serving')
    expect(existsSync(server.databaseFile)).toBe(true)
    expect((await new TestClient(server.baseUrl).get('/api/health')).status).toBe(200)
  })
})
