import { describe, expect, it } from 'vitest'
import { ownFirmChange } from '../../../../utils/contract/firm'
import { inviteBody, personChange } from '../../../../utils/contract/people'
import { firmBody, firmChange } from '../../../../utils/contract/places'
import { setUpBody } from '../../../../utils/contract/setUp'

const invitation = (name: string) => inviteBody.safeParse({ name, email: 'a@tarnvale.example', roles: ['technician'] })
const setUp = (firm: string, admin: string) => setUpBody.safeParse({
  token: 'a'.repeat(43), firm: { name: firm, telephone: '555 0142', timeZone: 'America/Chicago', units: 'lb' },
  admin: { name: admin, email: 'a@tarnvale.example', password: 'ten green cylinders' },
})

describe('a name that goes onto labels and papers', () => {
  it.each(['Łukasz Świątek', 'Șerban', 'Αθηνά Ψύξη', 'Київ Холод'])('may be %s', (name) => {
    expect(invitation(name).success).toBe(true)
    expect(personChange.safeParse({ name }).success).toBe(true)
    expect(ownFirmChange.safeParse({ name }).success).toBe(true)
    expect(firmBody.safeParse({ name, kind: 'reclaimer' }).success).toBe(true)
    expect(setUp(name, name).success).toBe(true)
  })

  it.each(['株式会社', 'Tarnvale 🧊', 'شركة'])('is refused as %s, and the letters are named that cannot be printed', (name) => {
    for (const answer of [invitation(name), personChange.safeParse({ name }), ownFirmChange.safeParse({ name }), firmChange.safeParse({ name }), setUp(name, 'Ada'), setUp('Tarnvale', name)]) {
      expect(answer.error?.issues).toEqual([expect.objectContaining({ message: expect.stringMatching(/^cannot be printed with .*: labels take Latin, Greek and Cyrillic letters$/) })])
    }
    expect(invitation('株 Tarn').error!.issues[0]!.message).toContain('with 株:')
  })
})
