import { SMTPServer } from 'smtp-server'
import { getPort } from 'get-port-please'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { MailAnswer } from '../../utils/contract/mail'
import type { InvitedAnswer } from '../../utils/contract/people'
import { TestClient } from '../helpers/client'
import { PASSWORD, setUpFirm, type Member } from '../helpers/firm'
import { startServer, type TestServer } from '../helpers/server'

let server: TestServer
let admin: Member
let post: SMTPServer
const received: { to: string[], from: string, text: string }[] = []

beforeAll(async () => {
  const port = await getPort({ host: '127.0.0.1', random: true })
  post = new SMTPServer({
    authOptional: true,
    disabledCommands: ['STARTTLS'],
    onRcptTo: ({ address }, _session, callback) => callback(address.startsWith('bounce') ? new Error('No such mailbox') : undefined),
    onData(stream, session, callback) {
      let text = ''
      stream.on('data', data => text += data)
      stream.on('end', () => {
        const { mailFrom, rcptTo } = session.envelope
        received.push({ to: rcptTo.map(({ address }) => address), from: mailFrom ? mailFrom.address : '', text })
        callback()
      })
    },
  })
  await new Promise<void>(done => post.listen(port, '127.0.0.1', done))
  server = await startServer({ env: { SMTP_URL: `smtp://127.0.0.1:${port}`, MAIL_FROM: 'cylinders@harbor.example' } })
  admin = await setUpFirm(server)
})
afterAll(async () => {
  await server?.stop()
  await new Promise<void>(done => post.close(done))
})

function invite(name: string, email: string) {
  return admin.client.post<InvitedAnswer>('/api/people', { name, email, roles: ['technician'] })
}

async function letters(query = '') {
  return (await admin.client.get<MailAnswer>(`/api/mail${query}`)).body
}

describe('a letter with a mail server', () => {
  it('goes out with a link that works, and is then the reader\'s alone', async () => {
    expect((await invite('Ines', 'ines@harbor.example')).body.mail).toBe('sent')
    expect(received).toHaveLength(1)
    expect(received[0]).toMatchObject({ to: ['ines@harbor.example'], from: 'cylinders@harbor.example' })
    const [kept] = (await letters()).items
    expect(kept).toMatchObject({ recipient: 'ines@harbor.example', body: null, error: null })
    expect(kept?.sentAt).not.toBeNull()
    const text = received[0]?.text.replace(/=\r?\n/g, '').replace(/=3D/g, '=') ?? ''
    const token = /invitation\/([\w-]{43})/.exec(text)?.[1]
    expect((await new TestClient(server.baseUrl).post(`/api/invitations/${token}`, { password: PASSWORD })).status).toBe(200)
  })

  it('that the mail server refuses is kept with the reason; the person stays invited and it can be sent again', async () => {
    const answer = await invite('Bo', 'bounce@harbor.example')
    expect(answer.status).toBe(201)
    expect(answer.body).toMatchObject({ mail: 'failed', person: { invited: true } })
    const [kept] = (await letters()).items
    expect(kept?.error).toContain('No such mailbox')
    expect(kept?.body).toContain('/invitation/')
    expect((await admin.client.post<InvitedAnswer>(`/api/people/${answer.body.person.id}/invitation`)).body.mail).toBe('failed')
  })

  it('does not let a name write headers or lines of its own', async () => {
    expect((await invite('Eve\r\nBcc: all@harbor.example', 'eve@harbor.example')).status).toBe(400)
    expect((await invite('Eve', 'eve@harbor.example\r\nBcc: all@harbor.example')).status).toBe(400)
    expect((await invite('Eve', 'eve@harbor.example,all@harbor.example')).status).toBe(400)
  })

  it('is listed a page at a time, newest first, each once', async () => {
    const first = await letters('?limit=2')
    expect(first.items).toHaveLength(2)
    const second = await letters(`?limit=2&cursor=${first.nextCursor}`)
    expect(second.items).toHaveLength(1)
    expect(second.nextCursor).toBeNull()
    expect([...first.items, ...second.items].map(({ recipient }) => recipient)).toEqual(['bounce@harbor.example', 'bounce@harbor.example', 'ines@harbor.example'])
  })
})
