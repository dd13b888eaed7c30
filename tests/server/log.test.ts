import { execFile } from 'node:child_process'
import { randomUUID } from 'node:crypto'
import { existsSync, readFileSync, statSync, writeFileSync } from 'node:fs'
import { join, resolve } from 'node:path'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { CheckpointLine, CheckpointsAnswer, LogHead, LogVerification } from '../../utils/contract/log'
import type { MailAnswer } from '../../utils/contract/mail'
import { addMember, setUpFirm, type Member } from '../helpers/firm'
import { startServer, type TestServer } from '../helpers/server'
import { lb, stampOf } from '../helpers/stamps'

let server: TestServer
let admin: Member
let manager: Member
let auditor: Member
let warehouse: Member
let technician: Member
let shopId: string

beforeAll(async () => {
  server = await startServer()
  admin = await setUpFirm(server)
  manager = await addMember(admin, 'Mina', ['manager'])
  auditor = await addMember(admin, 'Aron', ['auditor'])
  warehouse = await addMember(admin, 'Wim', ['warehouse'])
  technician = await addMember(admin, 'Tess', ['technician'])
  shopId = (await admin.client.post<{ id: string }>('/api/places', { name: 'Shop', kind: 'shop' })).body.id
  for (const serial of ['A1', 'A2']) await register(serial)
})
afterAll(() => server?.stop())

async function register(serial: string, by = warehouse, placeId = shopId) {
  const event = {
    id: randomUUID(), cylinderId: randomUUID(), kind: 'registered', occurredAt: new Date().toISOString(), placeId,
    details: { stamp: stampOf({ serial }), ownership: 'own', contents: 'evacuated', gross: lb(27.5) },
  }
  const { body } = await by.client.post<{ results: { outcome: string }[] }>('/api/events', { events: [event] })
  expect(body.results[0]?.outcome).toBe('accepted')
}

function sign(member: Member) {
  return member.client.post<CheckpointLine>('/api/log/checkpoints')
}

function verify(scope: string) {
  return auditor.client.get<LogVerification>(`/api/log/verify?scope=${scope}`)
}

async function publicKey(): Promise<string> {
  return (await auditor.client.get<CheckpointsAnswer>('/api/log/checkpoints')).body.publicKey
}

describe('a checkpoint', () => {
  it('is made for a manager, an auditor and an admin, and for nobody else', async () => {
    expect((await auditor.client.get<LogHead>('/api/log/head')).body).toEqual({ seq: 2, events: 2, checkpoint: null })
    for (const member of [warehouse, technician]) expect((await sign(member)).status).toBe(403)
    for (const [index, member] of [manager, auditor, admin].entries()) {
      const { status, body } = await sign(member)
      expect(status).toBe(201)
      expect(body).toMatchObject({ number: index + 1, events: 2, cylinders: 2, askedBy: { id: member.id } })
    }
    expect((await technician.client.get<LogHead>('/api/log/head')).body.checkpoint).toMatchObject({ number: 3, events: 2 })
  })

  it('is no event: the log stays as it is', async () => {
    expect((await auditor.client.get<LogHead>('/api/log/head')).body).toMatchObject({ seq: 2, events: 2 })
  })

  it('is mailed to the auditors and to nobody else, with the note that was signed', async () => {
    const { items } = (await admin.client.get<MailAnswer>('/api/mail')).body
    const letters = items.filter(({ subject }) => subject.includes('checkpoint'))
    expect(letters.map(({ recipient }) => recipient)).toEqual(Array.from({ length: 3 }, () => 'aron@harbor.example'))
    const { body: note } = await auditor.client.get<string>('/api/log/checkpoints/3')
    expect(letters[0]!.body).toContain(note)
    expect(letters[0]!.body).toContain(await publicKey())
  })

  it('is listed newest first, and kept as a text', async () => {
    const { body } = await manager.client.get<CheckpointsAnswer>('/api/log/checkpoints?limit=2')
    expect(body.items.map(({ number }) => number)).toEqual([3, 2])
    const older = await manager.client.get<CheckpointsAnswer>(`/api/log/checkpoints?limit=2&cursor=${body.nextCursor!}`)
    expect(older.body.items.map(({ number }) => number)).toEqual([1])
    const text = await auditor.client.get<string>('/api/log/checkpoints/1')
    expect(text.headers.get('content-type')).toBe('text/plain; charset=utf-8')
    expect(text.headers.get('content-disposition')).toBe('attachment; filename="checkpoint-1.txt"')
    expect(text.body).toMatch(/^custody-log\/[0-9a-f-]{36}\n2\n[A-Za-z0-9+/]{43}=\nnumber 1\nevents 2\nseq 2\nat .+Z\nprevious none\n\n\u2014 custody-log\/[0-9a-f-]{36} [A-Za-z0-9+/]{91}=\n$/)
    expect((await auditor.client.get('/api/log/checkpoints/99')).status).toBe(404)
    expect((await auditor.client.get('/api/log/checkpoints?cursor=x')).status).toBe(400)
    expect((await technician.client.get('/api/log/checkpoints')).status).toBe(403)
    expect((await technician.client.get('/api/log/checkpoints/1')).status).toBe(403)
  })

  it('is signed by a key that is in a file for its owner alone, and not in the database', () => {
    const file = `${server.databaseFile}.key`
    expect(statSync(file).mode & 0o777).toBe(0o600)
    const secret = readFileSync(file, 'utf8').trim()
    for (const end of ['', '-wal']) {
      if (existsSync(server.databaseFile + end)) expect(readFileSync(server.databaseFile + end).includes(secret)).toBe(false)
    }
  })
})

describe('verifying', () => {
  it('is for the auditor and the manager', async () => {
    for (const member of [warehouse, technician, admin]) expect((await member.client.get('/api/log/verify')).status).toBe(403)
    expect((await verify('everything')).status).toBe(400)
  })

  it('computes all, then only what has come since the checkpoint that was verified', async () => {
    expect((await verify('all')).body).toMatchObject({ ok: true, scope: 'all', checked: 2, cylinders: 2, checkpoints: 3, since: null, upTo: 3 })
    await register('A3')
    expect((await verify('since')).body).toMatchObject({ ok: true, scope: 'since', checked: 1, cylinders: 3, since: 3 })
    expect((await verify('caches')).body).toMatchObject({ ok: true, scope: 'caches', checked: 3, cylinders: 3 })
  })

  it('says how far it has come where lines are asked for, and the result in the last', async () => {
    const { body, headers } = await auditor.client.get<string>('/api/log/verify?scope=all', { accept: 'application/x-ndjson' })
    expect(headers.get('content-type')).toBe('application/x-ndjson; charset=utf-8')
    const lines = body.trimEnd().split('\n').map(line => JSON.parse(line) as object)
    expect(lines).toEqual([{ done: 3, of: 3 }, { result: expect.objectContaining({ ok: true, checked: 3 }) as object }])
  })
})

describe('the export', () => {
  it('is for the auditor and the manager, and stands up to the checker', async () => {
    for (const member of [warehouse, technician, admin]) expect((await member.client.get('/api/log/export')).status).toBe(403)
    const { body, headers, status } = await auditor.client.get<string>('/api/log/export')
    expect(status).toBe(200)
    expect(headers.get('content-disposition')).toBe('attachment; filename="custody-log.ndjson"')
    const file = join(server.folder, 'export.ndjson')
    writeFileSync(file, body)
    expect((await manager.client.get('/api/log/export')).status).toBe(200)
    const served = await fetch(`${server.baseUrl}/check-custody-log.mjs`)
    expect(await served.text()).toBe(readFileSync(resolve('public/check-custody-log.mjs'), 'utf8'))
    const key = await publicKey()
    const printed = await new Promise<string>((done, failed) =>
      execFile(process.execPath, [resolve('public/check-custody-log.mjs'), file, '--key', key], (error, stdout, stderr) => error ? failed(new Error(stdout + stderr)) : done(stdout)))
    expect(printed).toBe('3 events of 3 cylinders, 3 checkpoints: no fault found.\n')
  })
})

describe('the daily checkpoint', () => {
  it('is not made again by a restart within the day', async () => {
    await server.restart()
    await auditor.client.signIn(auditor.email, auditor.password)
    expect((await verify('all')).body).toMatchObject({ ok: true, checkpoints: 3 })
  })

  it('is made at the start of a server whose log holds events and has none', async () => {
    const other = await startServer()
    const owner = await setUpFirm(other)
    const keeper = await addMember(owner, 'Wim', ['warehouse'])
    const { id: placeId } = (await owner.client.post<{ id: string }>('/api/places', { name: 'Shop', kind: 'shop' })).body
    await register('B1', keeper, placeId)
    const newest = async () => (await owner.client.get<LogHead>('/api/log/head')).body.checkpoint
    expect(await newest()).toBeNull()
    await other.restart()
    await owner.client.signIn(owner.email, owner.password)
    await expect.poll(newest, { timeout: 20_000 }).toMatchObject({ number: 1, events: 1, askedBy: null })
    await other.stop()
  })
})
