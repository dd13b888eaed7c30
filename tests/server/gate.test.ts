import { request } from 'node:http'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { TestClient } from '../helpers/client'
import { setUpFirm, type Member } from '../helpers/firm'
import { startServer, type TestServer } from '../helpers/server'

let server: TestServer
let admin: Member

beforeAll(async () => {
  server = await startServer()
  admin = await setUpFirm(server)
})
afterAll(() => server?.stop())

/** Sends exactly these headers and this text. */
function raw(headers: Record<string, string>, body: string, path = '/api/people'): Promise<{ status: number, type: string, text: string }> {
  return new Promise((done, failed) => {
    const url = new URL(path, server.baseUrl)
    const sent = request(url, { method: 'POST', headers: { cookie: `collarbook=${admin.client.session}`, ...headers } }, (answer) => {
      let text = ''
      answer.on('data', data => text += data)
      answer.on('end', () => done({ status: answer.statusCode ?? 0, type: answer.headers['content-type'] ?? '', text }))
    })
    sent.on('error', failed)
    sent.end(body)
  })
}

const OWN = { 'sec-fetch-site': 'same-origin', 'content-type': 'application/json' }
const PERSON = JSON.stringify({ name: 'Eve', email: 'eve@harbor.example', roles: ['admin'] })

describe('the gate of the running server', () => {
  it.each([
    ['from another site', { ...OWN, 'sec-fetch-site': 'cross-site' }, 403],
    ['without saying where from', { 'content-type': 'application/json' }, 403],
    ['from a foreign origin', { 'content-type': 'application/json', 'origin': 'https://evil.example' }, 403],
    ['as plain text, as a form of another site can', { ...OWN, 'content-type': 'text/plain' }, 415],
    ['as a form', { ...OWN, 'content-type': 'application/x-www-form-urlencoded' }, 415],
  ])('turns away a change sent %s, in spite of the cookie', async (_, headers, expected) => {
    const answer = await raw(headers as Record<string, string>, PERSON)
    expect(answer.status).toBe(expected)
    expect(answer.type).toBe('application/problem+json')
    expect((await admin.client.get<{ items: unknown[] }>('/api/people')).body.items).toHaveLength(1)
  })

  it('takes a change with an Origin of its own', async () => {
    const answer = await raw({ 'content-type': 'application/json', 'origin': server.baseUrl }, '{}')
    expect(answer.status).toBe(400)
  })

  it.each(['', ' ', 'null', '[]', '{', '"x"', '{"__proto__":{"roles":["admin"]}}', '{"name":null}'])('answers 400 to the body %s', async (body) => {
    const answer = await raw(OWN, body)
    expect(answer.status).toBe(400)
    expect(JSON.parse(answer.text)).toMatchObject({ status: 400, title: 'Malformed' })
  })

  it('counts a body whose length is not told: 512 KiB pass to the schema, one byte more is 413', async () => {
    const padding = (length: number) => `{"name":"${'x'.repeat(length - 11)}"}`
    expect(padding(512 * 1024)).toHaveLength(524_288)
    expect((await raw({ ...OWN, 'transfer-encoding': 'chunked' }, padding(512 * 1024))).status).toBe(400)
    expect((await raw({ ...OWN, 'transfer-encoding': 'chunked' }, padding(512 * 1024 + 1))).status).toBe(413)
    expect((await raw(OWN, padding(512 * 1024 + 1))).status).toBe(413)
  })

  it('refuses a query that stands twice or is not known', async () => {
    expect((await admin.client.get('/api/people?active=true')).status).toBe(200)
    expect((await admin.client.get('/api/people?active=true&active=false')).status).toBe(400)
    expect((await admin.client.get('/api/people?role=admin')).status).toBe(400)
    expect((await admin.client.get('/api/firm?x=1')).status).toBe(400)
  })

  it('answers whatever is not known under /api with problem details and nothing else', async () => {
    for (const path of ['/api/nothing', '/api/_auth/session', '/api/people/x/y/z']) {
      const answer = await admin.client.get<Record<string, unknown>>(path)
      expect(answer.status).toBe(404)
      expect(answer.headers.get('content-type')).toBe('application/problem+json')
      expect(Object.keys(answer.body).sort()).toEqual(['detail', 'status', 'title', 'type'])
    }
  })

  it('writes the headers that keep a page safe, and none that says what serves it', async () => {
    const { headers } = await new TestClient(server.baseUrl).get('/sign-in', { accept: 'text/html' })
    expect(headers.get('x-powered-by')).toBeNull()
    expect(headers.get('cache-control')).toBe('no-store')
    expect(headers.get('x-content-type-options')).toBe('nosniff')
    expect(headers.get('x-frame-options')).toBe('DENY')
    expect(headers.get('referrer-policy')).toBe('same-origin')
    expect(headers.get('permissions-policy')).toContain('camera=(self)')
    expect(headers.get('content-security-policy')).toMatch(/script-src 'self' 'strict-dynamic' 'nonce-[\w+/=-]{20,}' 'wasm-unsafe-eval'/)
    expect(headers.get('strict-transport-security')).toBeNull()
    expect(headers.get('access-control-allow-origin')).toBeNull()
  })

  it('keeps no answer of the API in a cache', async () => {
    expect((await admin.client.get('/api/session')).headers.get('cache-control')).toBe('no-store')
  })
})

describe('a server that people reach by https', () => {
  it('keeps its cookie for that host and asks for https from then on', async () => {
    const secure = await startServer({ env: { PUBLIC_URL: 'https://cylinders.harbor.example' } })
    try {
      const { client } = await setUpFirm(secure)
      expect([...client.cookies.keys()]).toEqual(['__Host-collarbook'])
      const again = await client.signIn('ada@harbor.example', 'copper-elbow-1987')
      expect(again.headers.getSetCookie()[0]).toMatch(/^__Host-collarbook=.*; Path=\/; Expires=[^;]+; HttpOnly; Secure; SameSite=Lax$/)
      expect(again.headers.get('strict-transport-security')).toMatch(/^max-age=31536000/)
      expect((await client.get('/api/session')).status).toBe(200)
    }
    finally {
      await secure.stop()
    }
  })
})
