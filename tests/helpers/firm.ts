import type { Role } from '../../utils/access/roles'
import type { MailAnswer } from '../../utils/contract/mail'
import type { InvitedAnswer } from '../../utils/contract/people'
import { TestClient } from './client'
import type { TestServer } from './server'

export const ADMIN = { name: 'Ada Lind', email: 'ada@harbor.example', password: 'copper-elbow-1987' }
export const PASSWORD = 'brazed-joint-4411'

export interface Member { id: string, email: string, password: string, client: TestClient }

/** Takes up the printed set-up link; answers its admin, signed in. */
export async function setUpFirm(server: TestServer): Promise<Member> {
  const client = new TestClient(server.baseUrl)
  const answer = await client.post<{ user: { id: string } }>('/api/setup', {
    token: server.setUpToken(),
    firm: { name: 'Quillfen Cooling', telephone: '555-0100', timeZone: 'America/Chicago', units: 'lb' },
    admin: ADMIN,
  })
  if (answer.status !== 201) throw new Error(`Set-up answered ${answer.status}: ${JSON.stringify(answer.body)}`)
  return { id: answer.body.user.id, email: ADMIN.email, password: ADMIN.password, client }
}

/** Invites a person and takes the invitation up, as that person would from the letter; answers them signed in. */
export async function addMember(admin: Member, name: string, roles: Role[], more: { trainee?: boolean } = {}): Promise<Member> {
  const email = `${name.toLowerCase()}@harbor.example`
  const invited = await admin.client.post<InvitedAnswer>('/api/people', { name, email, roles, ...more })
  if (invited.status !== 201) throw new Error(`The invitation answered ${invited.status}: ${JSON.stringify(invited.body)}`)
  const client = new TestClient(admin.client.baseUrl)
  const taken = await client.post(`/api/invitations/${await invitationToken(admin, email)}`, { password: PASSWORD })
  if (taken.status !== 200) throw new Error(`Taking it up answered ${taken.status}: ${JSON.stringify(taken.body)}`)
  return { id: invited.body.person.id, email, password: PASSWORD, client }
}

/** The token in the newest letter to an address. */
export async function invitationToken({ client }: Pick<Member, 'client'>, email: string): Promise<string> {
  const { body } = await client.get<MailAnswer>('/api/mail')
  const letter = body.items.find(line => line.recipient === email)
  return /invitation\/([\w-]{43})/.exec(letter?.body ?? '')?.[1] ?? ''
}
