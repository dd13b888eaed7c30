import { createClient } from '@libsql/client'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { InvitedAnswer, PeopleAnswer, PersonAnswer } from '../../utils/contract/people'
import type { MailAnswer } from '../../utils/contract/mail'
import type { Place, PlacesAnswer } from '../../utils/contract/places'
import type { ProblemDetails } from '../../utils/contract/problem'
import { TestClient } from '../helpers/client'
import { addMember, ADMIN, invitationToken, PASSWORD, setUpFirm, type Member } from '../helpers/firm'
import { startServer, type TestServer } from '../helpers/server'

let server: TestServer
let admin: Member
let tech: Member
let auditor: Member

beforeAll(async () => {
  server = await startServer()
  admin = await setUpFirm(server)
  tech = await addMember(admin, 'Tess', ['technician'], { trainee: true })
  auditor = await addMember(admin, 'Otto', ['auditor'])
})
afterAll(() => server?.stop())

function visitor(): TestClient {
  return new TestClient(server.baseUrl)
}

describe('the firm\'s people', () => {
  it('are known to everybody signed in, their addresses only to admin and auditor', async () => {
    const seen = async (member: Member) => (await member.client.get<PeopleAnswer>('/api/people')).body.items.map(line => [line.name, line.email])
    expect(await seen(admin)).toEqual([[ADMIN.name, ADMIN.email], ['Otto', 'otto@harbor.example'], ['Tess', 'tess@harbor.example']])
    expect(await seen(auditor)).toEqual(await seen(admin))
    expect(await seen(tech)).toEqual([[ADMIN.name, null], ['Otto', null], ['Tess', null]])
  })

  it('never show a password\'s hash', async () => {
    const { body } = await admin.client.get('/api/people')
    expect(JSON.stringify(body)).not.toMatch(/hash|scrypt/i)
  })

  it('are not known outside', async () => {
    expect((await visitor().get('/api/people')).status).toBe(401)
  })

  it('are managed by the admin alone', async () => {
    for (const { client } of [tech, auditor]) {
      expect((await client.post('/api/people', { name: 'Eve', email: 'eve@harbor.example', roles: ['admin'] })).status).toBe(403)
      expect((await client.patch(`/api/people/${tech.id}`, { roles: ['admin'] })).status).toBe(403)
      expect((await client.post(`/api/people/${tech.id}/invitation`)).status).toBe(403)
      expect((await client.get('/api/mail')).status).toBe(403)
    }
    expect((await visitor().post('/api/people', {})).status).toBe(401)
  })

  it('are refused to the one without the right before a body is looked at', async () => {
    expect((await tech.client.post('/api/people', { nonsense: true })).status).toBe(403)
  })

  it('are refused on the record', async () => {
    await auditor.client.patch(`/api/people/${tech.id}`, { roles: ['admin'] })
    const database = createClient({ url: `file:${server.databaseFile}`, timeout: 5000 })
    const { rows } = await database.execute('select person_id, what, subject from security_log order by id desc limit 1')
    database.close()
    expect(rows[0]).toMatchObject({ person_id: auditor.id, what: 'refused', subject: 'people:manage' })
  })

  it('change by name, certification and trainee, and nothing else', async () => {
    const change = await admin.client.patch(`/api/people/${tech.id}`, { name: 'Tess Oran', certification: 'Type II 4411', trainee: false })
    expect(change.body).toMatchObject({ person: { name: 'Tess Oran', certification: 'Type II 4411', trainee: false, roles: ['technician'] } })
    expect((await tech.client.get('/api/session')).body).toMatchObject({ user: { name: 'Tess Oran', trainee: false } })
    expect((await admin.client.patch(`/api/people/${tech.id}`, { certification: null })).body).toMatchObject({ person: { certification: null } })
    for (const bad of [{ passwordHash: 'x' }, { id: auditor.id }, { roles: [] }, { roles: ['owner'] }, { roles: ['admin', 'admin'] }, {}, { name: '' }]) {
      expect((await admin.client.patch(`/api/people/${tech.id}`, bad)).status).toBe(400)
    }
  })

  it('have a certification by its type and number, or as it was written', async () => {
    const { body } = await admin.client.patch<PersonAnswer>(`/api/people/${tech.id}`, { certificationType: 'II', certificationNumber: '4411' })
    expect(body.person).toMatchObject({ certificationType: 'II', certificationNumber: '4411', certification: null })
    expect((await tech.client.get('/api/session')).body).toMatchObject({ user: { certificationType: 'II', certificationNumber: '4411' } })
    const noType = await admin.client.patch<ProblemDetails>(`/api/people/${tech.id}`, { certificationType: null })
    expect([noType.status, noType.body.errors?.map(({ path }) => path)]).toEqual([422, ['certificationNumber']])
    expect((await admin.client.patch(`/api/people/${tech.id}`, { certificationType: 'IV' })).status).toBe(400)
    expect((await admin.client.patch(`/api/people/${tech.id}`, { certificationType: null, certificationNumber: null })).status).toBe(200)
  })

  it('are 404 where unknown and 400 where the id is none', async () => {
    expect((await admin.client.patch('/api/people/01890000-0000-7000-8000-000000000000', { name: 'Nobody' })).status).toBe(404)
    expect((await admin.client.patch('/api/people/7', { name: 'Nobody' })).status).toBe(400)
    expect((await admin.client.patch('/api/people/%E0%A4%A', { name: 'Nobody' })).status).toBe(400)
  })
})

describe('a trainee\'s usual supervisor', () => {
  const change = (id: string, body: object) => admin.client.patch<PersonAnswer & ProblemDetails>(`/api/people/${id}`, body)

  it('is a certified technician or manager in service, and no trainee', async () => {
    const dan = await addMember(admin, 'Dan', ['technician'])
    const tim = await addMember(admin, 'Tim', ['technician'], { trainee: true })
    const uncertified = await change(tim.id, { supervisorId: dan.id })
    expect([uncertified.status, uncertified.body.errors?.map(({ path }) => path)]).toEqual([422, ['supervisorId']])

    await change(dan.id, { certificationType: 'universal' })
    expect((await change(tim.id, { supervisorId: dan.id })).body.person.supervisor).toEqual({ id: dan.id, name: 'Dan' })
    for (const other of [tim.id, auditor.id, '01890000-0000-7000-8000-000000000000']) {
      expect((await change(tim.id, { supervisorId: other })).status).toBe(422)
    }
    // Everybody who signs in sees it: the trainee's own forms begin with it.
    const seen = (await tim.client.get<PeopleAnswer>('/api/people')).body.items.find(({ id }) => id === tim.id)
    expect(seen?.supervisor).toEqual({ id: dan.id, name: 'Dan' })
  })

  it('is nobody\'s who is no trainee, and ends with the training', async () => {
    const dan = await addMember(admin, 'Dana', ['manager'])
    await change(dan.id, { certificationType: 'I' })
    const tom = await addMember(admin, 'Tom', ['technician'])
    expect((await change(tom.id, { supervisorId: dan.id })).status).toBe(422)
    expect((await change(tom.id, { trainee: true, supervisorId: dan.id })).body.person.supervisor?.name).toBe('Dana')
    expect((await change(tom.id, { trainee: false })).body.person.supervisor).toBeNull()
    expect((await change(tom.id, { trainee: true })).body.person.supervisor).toBeNull()
  })

  it('is nobody any more once that person may not supervise', async () => {
    for (const end of [{ active: false }, { trainee: true }, { roles: ['warehouse'] }, { certificationType: null }]) {
      const name = Object.keys(end)[0]!
      const eve = await addMember(admin, `Eve-${name}`, ['technician'])
      const kim = await addMember(admin, `Kim-${name}`, ['technician'], { trainee: true })
      await change(eve.id, { certificationType: 'II' })
      await change(kim.id, { supervisorId: eve.id })
      await change(eve.id, { name: `Eva ${name}` })
      expect((await change(kim.id, { name: 'Kim' })).body.person.supervisor?.id, name).toBe(eve.id)
      await change(eve.id, end)
      expect((await change(kim.id, { name: 'Kim' })).body.person.supervisor, name).toBeNull()
    }
  })
})

describe('a trainee', () => {
  const change = (id: string, body: object) => admin.client.patch<PersonAnswer & ProblemDetails>(`/api/people/${id}`, body)

  it('is a technician and nobody else', async () => {
    const may = await addMember(admin, 'May', ['manager'])
    const refused = await change(may.id, { trainee: true })
    expect([refused.status, refused.body.errors?.map(({ path }) => path)]).toEqual([422, ['trainee']])
    const invited = await admin.client.post<ProblemDetails>('/api/people', { name: 'Moe', email: 'moe@harbor.example', roles: ['warehouse'], trainee: true })
    expect([invited.status, invited.body.errors?.map(({ path }) => path)]).toEqual([422, ['trainee']])
  })

  it('is none any more with another role', async () => {
    const ned = await addMember(admin, 'Ned', ['technician'], { trainee: true })
    expect((await change(ned.id, { roles: ['manager'] })).body.person.trainee).toBe(false)
  })
})

describe('a technician\'s van', () => {
  const van = async (name: string) => (await admin.client.post<Place>('/api/places', { name, kind: 'van' })).body
  const holderOf = async (id: string) => (await admin.client.get<PlacesAnswer>('/api/places')).body.items.find(each => each.id === id)?.technicianName
  const change = (id: string, body: object) => admin.client.patch<PersonAnswer & ProblemDetails>(`/api/people/${id}`, body)

  it('is the same from the person and from the place, and goes from one hand to the next', async () => {
    const [one, other] = [await van('Van 11'), await van('Van 14')]
    const [ole, pat] = [await addMember(admin, 'Ole', ['technician']), await addMember(admin, 'Pat', ['technician'])]
    expect((await change(ole.id, { vanId: one.id })).body.person.vans).toEqual([{ id: one.id, name: 'Van 11' }])
    expect(await holderOf(one.id)).toBe('Ole')

    expect((await change(pat.id, { vanId: one.id })).body.person.vans.map(({ name }) => name)).toEqual(['Van 11'])
    expect((await change(ole.id, { name: 'Ole' })).body.person.vans).toEqual([])

    await change(pat.id, { vanId: other.id })
    expect([await holderOf(one.id), await holderOf(other.id)]).toEqual([null, 'Pat'])
    await change(pat.id, { vanId: null })
    expect(await holderOf(other.id)).toBeNull()

    await admin.client.patch(`/api/places/${one.id}`, { technicianId: ole.id })
    expect((await change(ole.id, { name: 'Ole' })).body.person.vans).toEqual([{ id: one.id, name: 'Van 11' }])
  })

  it('is a van in use, of somebody who is a technician', async () => {
    const shop = (await admin.client.post<Place>('/api/places', { name: 'Shop V', kind: 'shop' })).body
    const sold = await van('Van 17')
    await admin.client.patch(`/api/places/${sold.id}`, { active: false })
    const uma = await addMember(admin, 'Uma', ['technician'])
    for (const wrong of [shop.id, sold.id, '01890000-0000-7000-8000-000000000000']) {
      expect((await change(uma.id, { vanId: wrong })).status).toBe(422)
    }
    expect((await change(auditor.id, { vanId: (await van('Van 20')).id })).body.errors?.map(({ path }) => path)).toEqual(['vanId'])
  })

  it('stays with its technician where the change beside it is refused', async () => {
    const kept = await van('Van 23')
    const refused = await change(admin.id, { roles: ['technician'], vanId: kept.id })
    expect([refused.status, refused.body.type]).toEqual([409, 'last-admin'])
    expect(await holderOf(kept.id)).toBeNull()
  })

  it('is free again once its technician is none any more, or is turned off', async () => {
    for (const end of [{ roles: ['warehouse'] }, { active: false }]) {
      const name = Object.keys(end)[0]!
      const left = await van(`Van ${name}`)
      const gil = await addMember(admin, `Gil-${name}`, ['technician'])
      await change(gil.id, { vanId: left.id })
      expect((await change(gil.id, { name: `Gill ${name}` })).body.person.vans, name).toHaveLength(1)
      expect((await change(gil.id, end)).body.person.vans, name).toEqual([])
      expect(await holderOf(left.id), name).toBeNull()
    }
  })

  it('can be given with the invitation', async () => {
    const given = await van('Van 26')
    const { body } = await admin.client.post<InvitedAnswer>('/api/people', { name: 'Vic', email: 'vic@harbor.example', roles: ['technician'], vanId: given.id, certificationType: 'II' })
    expect(body.person).toMatchObject({ vans: [{ id: given.id, name: 'Van 26' }], certificationType: 'II' })
  })
})

describe('an invitation', () => {
  it('goes by a letter that is kept, shows whose it is, and is taken up once', async () => {
    const invited = await admin.client.post<InvitedAnswer>('/api/people', { name: 'Ines', email: 'Ines@Harbor.example', roles: ['warehouse'] })
    expect(invited.status).toBe(201)
    expect(invited.body).toMatchObject({ mail: 'kept', person: { email: 'ines@harbor.example', invited: true } })
    const token = await invitationToken(admin, 'ines@harbor.example')
    const client = visitor()
    expect((await client.get(`/api/invitations/${token}`)).body).toMatchObject({ name: 'Ines', email: 'ines@harbor.example', firmName: 'Quillfen Cooling' })
    const both = await Promise.all([client, visitor()].map(one => one.post(`/api/invitations/${token}`, { password: PASSWORD })))
    expect(both.map(({ status }) => status).sort()).toEqual([200, 404])
    expect((await visitor().get(`/api/invitations/${token}`)).status).toBe(404)
    expect((await visitor().signIn('ines@harbor.example', PASSWORD)).status).toBe(200)
  })

  it('is ended by the next one, and by turning the person off', async () => {
    const { body } = await admin.client.post<InvitedAnswer>('/api/people', { name: 'Leo', email: 'leo@harbor.example', roles: ['technician'] })
    const first = await invitationToken(admin, 'leo@harbor.example')
    expect((await admin.client.post(`/api/people/${body.person.id}/invitation`)).status).toBe(200)
    const second = await invitationToken(admin, 'leo@harbor.example')
    expect(second).not.toBe(first)
    expect((await visitor().get(`/api/invitations/${first}`)).status).toBe(404)
    expect((await visitor().get(`/api/invitations/${second}`)).status).toBe(200)
    await admin.client.patch(`/api/people/${body.person.id}`, { active: false })
    expect((await visitor().post(`/api/invitations/${second}`, { password: PASSWORD })).status).toBe(404)
    expect((await admin.client.post(`/api/people/${body.person.id}/invitation`)).status).toBe(409)
  })

  it('refuses a weak password and stays good', async () => {
    await admin.client.post('/api/people', { name: 'Mara', email: 'mara@harbor.example', roles: ['technician'] })
    const token = await invitationToken(admin, 'mara@harbor.example')
    expect((await visitor().post(`/api/invitations/${token}`, { password: 'mara@harbor.example' })).status).toBe(422)
    expect((await visitor().post(`/api/invitations/${token}`, { password: 'eleven-char' })).status).toBe(400)
    expect((await visitor().post(`/api/invitations/${token}`, { password: 'twelve-chars' })).status).toBe(200)
  })

  it('to one who has a password is a new password, and ends their sessions', async () => {
    const nora = await addMember(admin, 'Nora', ['technician'])
    await admin.client.post(`/api/people/${nora.id}/invitation`)
    const { body } = await admin.client.get<MailAnswer>('/api/mail?limit=1')
    expect(body.items[0]?.subject).toContain('new password')
    expect(body.nextCursor).not.toBeNull()
    expect((await nora.client.get('/api/session')).status).toBe(200)
    await visitor().post(`/api/invitations/${await invitationToken(admin, nora.email)}`, { password: 'seven blue valves' })
    expect((await nora.client.get('/api/session')).status).toBe(401)
    expect((await visitor().signIn(nora.email, PASSWORD)).status).toBe(401)
  })

  it('to an address that is taken is a conflict, whatever its case', async () => {
    expect((await admin.client.post('/api/people', { name: 'Ada Two', email: 'ADA@harbor.example', roles: ['manager'] })).status).toBe(409)
  })

  it('is unknown for a made-up token', async () => {
    expect((await visitor().get(`/api/invitations/${'A'.repeat(43)}`)).status).toBe(404)
    expect((await visitor().post(`/api/invitations/${'A'.repeat(43)}`, { password: PASSWORD })).status).toBe(404)
  })
})

describe('the last administrator', () => {
  it('can neither be turned off nor lose the role, but may have another beside it', async () => {
    for (const change of [{ active: false }, { roles: ['manager'] }]) {
      const answer = await admin.client.patch<{ type: string }>(`/api/people/${admin.id}`, change)
      expect(answer.status).toBe(409)
      expect(answer.body.type).toBe('last-admin')
    }
    expect((await admin.client.get('/api/session')).body).toMatchObject({ user: { roles: ['admin'] } })
    // One who was only invited cannot sign in yet and does not count.
    await admin.client.post('/api/people', { name: 'Vera', email: 'vera@harbor.example', roles: ['admin'] })
    expect((await admin.client.patch(`/api/people/${admin.id}`, { active: false })).status).toBe(409)
  })

  it('is never taken away by two who turn each other off at once', async () => {
    const second = await addMember(admin, 'Bela', ['admin'])
    const answers = await Promise.all([
      admin.client.patch(`/api/people/${second.id}`, { active: false }),
      second.client.patch(`/api/people/${admin.id}`, { active: false }),
    ])
    // The other finds itself the last (409), or turned off already (401).
    expect(answers.filter(({ status }) => status === 200)).toHaveLength(1)
    const left = answers[0]?.status === 200 ? admin : second
    const { body } = await left.client.get<PeopleAnswer>('/api/people?active=true')
    expect(body.items.filter(line => line.roles.includes('admin') && !line.invited)).toHaveLength(1)
  })
})

describe('a person whom two administrators change at once', () => {
  it('keeps what each of them changed', async () => {
    const wes = await addMember(admin, 'Wes', ['warehouse'])
    const answers = await Promise.all([{ active: false }, { name: 'Wesley' }, { certification: 'Type II' }].map(change => admin.client.patch(`/api/people/${wes.id}`, change)))
    expect(answers.map(answer => answer.status)).toEqual([200, 200, 200])
    const { body } = await admin.client.get<PeopleAnswer>('/api/people')
    expect(body.items.find(person => person.id === wes.id)).toMatchObject({ name: 'Wesley', certification: 'Type II', active: false })
    expect((await wes.client.get('/api/session')).status).toBe(401)
  })
})
