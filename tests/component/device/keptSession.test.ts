import { registerEndpoint } from '@nuxt/test-utils/runtime'
import { createError } from 'h3'
import { createPinia, setActivePinia } from 'pinia'
import { afterEach, beforeEach, describe, expect, it } from 'vitest'
import { keepPerson, keptPerson } from '~~/composables/keptPerson'
import { useSessionStore } from '~~/stores/session'
import type { User } from '~~/utils/contract/session'

const TINA: User = { id: 'tina', name: 'Tina', email: 'tina@firm.example', roles: ['technician'], trainee: false, certification: null, certificationType: null, certificationNumber: null, units: 'lb' }

/** What the server answers to the question who is signed in. */
let status = 200
let signedIn: User | null = TINA
let asked = 0
registerEndpoint('/api/session', () => {
  asked++
  if (status !== 200) throw createError({ statusCode: status })
  return signedIn ? { user: { ...signedIn, units: 'kg' } } : '<html>Welcome</html>'
})

/** A page opened from the device. */
function opened() {
  setActivePinia(createPinia())
  return useSessionStore()
}

beforeEach(() => {
  asked = 0
  status = 200
  signedIn = TINA
})
afterEach(() => localStorage.clear())

describe('who is signed in, on a page that was opened from the device', () => {
  it('is who the device remembers, without waiting for the server', async () => {
    keepPerson(TINA)
    const session = opened()
    await session.load()
    expect(session.user).toEqual(TINA)
    expect(session.isKept).toBe(true)
    expect(session.mayI('events:post')).toBe(true)
    expect(asked).toBe(0)
  })

  it('is corrected by the server once it is reached', async () => {
    keepPerson(TINA)
    const session = opened()
    await session.load()
    expect(await session.confirm()).toBe('same')
    expect(session.user?.units).toBe('kg')
    expect(session.isKept).toBe(false)
  })

  it.each([[401, 'ended'], [503, 'unreached']] as const)('stays so while a form may be open, also where the server answers %i', async (answer, found) => {
    keepPerson(TINA)
    const session = opened()
    await session.load()
    status = answer
    expect(await session.confirm()).toBe(found)
    expect(session.user).toEqual(TINA)
    expect(session.isKept).toBe(true)
  })

  it('does not become another person in the midst of a page, who is the one of the next', async () => {
    keepPerson(TINA)
    const session = opened()
    await session.load()
    signedIn = { ...TINA, id: 'wes', name: 'Wes' }
    expect(await session.confirm()).toBe('ended')
    expect(session.user).toEqual(TINA)
    const next = opened()
    await next.load()
    expect(next.user?.name).toBe('Wes')
  })

  it('stays so where a network answers with a page of its own', async () => {
    keepPerson(TINA)
    const session = opened()
    await session.load()
    signedIn = null
    expect(await session.confirm()).toBe('unreached')
    expect([session.user, keptPerson()]).toEqual([TINA, TINA])
  })

  it('is nobody where the device remembers nobody and the server knows nobody', async () => {
    status = 401
    const session = opened()
    await session.load()
    expect(session.user).toBeNull()
    expect(session.known).toBe(true)
  })
})

describe('what the device remembers', () => {
  it.each(['{', 'null', '"tina"', '{"id":7,"roles":[]}', '{"id":"tina"}'])('is nobody where it reads %s', (text) => {
    localStorage.setItem('collarbook-person', text)
    expect(keptPerson()).toBeNull()
  })

  it('goes when it is told to forget', () => {
    keepPerson(TINA)
    expect(keptPerson()).toEqual(TINA)
    keepPerson(null)
    expect(keptPerson()).toBeNull()
  })
})
