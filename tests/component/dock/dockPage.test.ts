import 'fake-indexeddb/auto'
import { IDBFactory } from 'fake-indexeddb'
import { mountSuspended, registerEndpoint } from '@nuxt/test-utils/runtime'
import type { VueWrapper } from '@vue/test-utils'
import { readBody, setResponseStatus } from 'h3'
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest'
import { dockBox } from '~~/composables/dockBox'
import DockPage from '~~/pages/d/[token].vue'
import type { DockAnswer } from '~~/utils/contract/dock'
import type { DockEntry } from '~~/utils/dock/entry'
import { MAC_BYTES, writeToken } from '~~/utils/dock/linkToken'

const LINKS = ['01935c2f-7d41-7c22-9f0a-0123456789ab', '01935c2f-7d41-7c22-9f0a-0123456789ac'] as const
const [TOKEN, NEXT_TOKEN] = LINKS.map(linkId => writeToken({ linkId, expiresAt: Date.UTC(2030, 0, 1), mac: new Uint8Array(MAC_BYTES) })) as [string, string]
const SHIPMENT = '01935c2f-0000-7000-8000-00000000000a'
const CYLINDERS = [
  { cylinderId: '01935c2f-0000-7000-8000-000000000001', serial: 'K-4821', ours: { unit: 'lb' as const, value: 52.4 } },
  { cylinderId: '01935c2f-0000-7000-8000-000000000002', serial: 'K-9377', ours: { unit: 'lb' as const, value: 61.0 } },
]

/** What the server has, in the order of recording, and the ids of each request. */
let recorded: DockEntry[]
let requests: string[][]
/** How the next requests end: unreached, lost after they were recorded, or as if the link had ended. */
let fault: 'unreached' | 'lost' | 'ended' | null
let refuses: (entry: DockEntry) => boolean

for (const [at, token] of [TOKEN, NEXT_TOKEN].entries()) {
  registerEndpoint(`/api/dock/${token}`, {
    method: 'GET',
    handler: (event) => {
      if (fault === 'unreached') return fail(event, 503)
      return fault === 'ended' && at === 0 ? fail(event, 404) : answer(LINKS[at]!)
    },
  })
  registerEndpoint(`/api/dock/${token}/shipments/${SHIPMENT}/entries`, {
    method: 'POST',
    handler: async (event) => {
      const { entries } = await readBody<{ entries: DockEntry[] }>(event)
      if (fault === 'unreached') return fail(event, 503)
      if (fault === 'ended' && at === 0) return fail(event, 404)
      requests.push(entries.map(({ id }) => id))
      const results = entries.map((entry) => {
        if (refuses(entry)) return { id: entry.id, outcome: 'refused', problem: { type: 'about:blank', title: 'No', status: 422, detail: 'Not on this shipment.' } }
        const outcome = recorded.some(({ id }) => id === entry.id) ? 'duplicate' : 'accepted'
        if (outcome === 'accepted') recorded.push(entry)
        return { id: entry.id, outcome }
      })
      if (fault === 'lost') return fail(event, 504)
      return { results, dock: answer(LINKS[at]!) }
    },
  })
}

function fail(event: Parameters<typeof setResponseStatus>[0], status: number) {
  setResponseStatus(event, status)
  return { type: status === 404 ? 'link-unknown' : 'about:blank', title: 'No', status, detail: 'Not now.' }
}

function answer(linkId: string): DockAnswer {
  const isWeighed = (id: string) => recorded.some(({ kind, said }) => kind === 'gross' && 'cylinderId' in said && said.cylinderId === id)
  return {
    shipment: { id: SHIPMENT, number: 12, state: 'dispatched' },
    closed: null,
    from: { name: 'Quillfen Cooling', telephone: '555-0100' },
    to: { name: 'Tarnvale Reclaim' },
    link: { id: linkId, forWhom: 'Dock 2', expiresAt: '2030-01-01T00:00:00.000Z' },
    unit: 'lb',
    cylinders: CYLINDERS.map(({ cylinderId, serial, ours }) => ({
      cylinderId, serial, labelCode: null, specification: 'DOT-4BA400', refrigerant: 'R-22', condition: 'clean', ourGross: isWeighed(cylinderId) ? ours : null,
    })),
    entries: recorded.map(entry => ({ ...entry, linkId })),
  }
}

let page: VueWrapper | null
beforeEach(() => {
  globalThis.indexedDB = new IDBFactory()
  localStorage.clear()
  vi.spyOn(window, 'scrollTo').mockImplementation(() => {})
  ;[recorded, requests, fault, refuses] = [[], [], null, () => false]
})
afterEach(() => page?.unmount())

async function opened(token = TOKEN): Promise<VueWrapper> {
  page = await mountSuspended(DockPage, { route: `/d/${token}` })
  await eventually(() => expect(page!.text()).not.toContain('Opening the shipment'))
  return page
}

async function begun(token = TOKEN): Promise<VueWrapper> {
  const here = await opened(token)
  if (here.text().includes('Before you begin')) {
    await here.get('input[autocomplete="name"]').setValue('Dana')
    await here.get('form').trigger('submit')
  }
  return here
}

/** Presses the button that says this, as soon as it is there. */
async function pressed(here: VueWrapper, words: string) {
  const button = await eventually(() => {
    const found = here.findAll('button').find(one => plain(one.text()) === words || one.attributes('aria-label') === words)
    if (!found) throw new Error(`No button says ${words}`)
    return found
  })
  await button.trigger('click')
}
/** As soon as it holds; a busy machine takes its time. */
const eventually = <T>(check: () => T | Promise<T>) => vi.waitFor(check, { timeout: 15_000 })
const plain = (text: string) => text.replaceAll('\u00A0', ' ')
const status = (here: VueWrapper) => here.get('header [role="status"]').text()

async function found(here: VueWrapper, typed: string) {
  await here.get('input[enterkeyhint="search"]').setValue(typed)
  await here.get('form').trigger('submit')
  await eventually(() => expect(here.text()).toContain('All cylinders'))
}

async function weighed(here: VueWrapper, keys: string[], verb: string) {
  for (const key of keys) await pressed(here, key)
  await pressed(here, verb)
}

describe('a shipment at the dock', () => {
  it('asks for a name once, ticks what is found by its last characters, and shows our weight only after theirs', async () => {
    const here = await opened()
    await here.get('form').trigger('submit')
    expect(here.text()).toContain('Type your name.')
    await here.get('input[autocomplete="name"]').setValue('Dana')
    await here.get('form').trigger('submit')
    expect(here.text()).toContain('0 of 2 here')

    await found(here, '821')
    await eventually(() => expect(recorded).toMatchObject([{ kind: 'here', name: 'Dana', said: { cylinderId: CYLINDERS[0]!.cylinderId } }]))
    expect(here.text()).not.toContain('52.4')
    await weighed(here, ['4', '9', 'Decimal point', '9'], 'Enter 49.9 lb')
    // 52.4 lb less 49.9 lb; two scales at 0.5 % of 52.4 lb may be 0.5 lb apart.
    await eventually(() => expect(plain(here.text())).toContain('Yours is 2.5 lb less than the sender’s'))
    expect(recorded[1]).toMatchObject({ kind: 'gross', said: { gross: { unit: 'lb', value: 49.9 } } })
    await eventually(() => expect(status(here)).toBe('all sent'))
    await pressed(here, 'All cylinders')
    expect(here.findAll('main li').map(row => plain(row.text()))).toEqual(['SN K-9377R-22not looked at', 'SN K-4821R-2249.9 lb, weight differs'])
  })

  it('takes no weight of nothing', async () => {
    const here = await begun()
    await found(here, '821')
    await weighed(here, ['0'], 'Enter 0.0 lb')
    expect(here.text()).toContain('A cylinder weighs something.')
  })

  it('takes an entry out by another one, and keeps both', async () => {
    const here = await begun()
    await found(here, 'K-9377')
    await pressed(here, 'Retest date passed')
    await eventually(() => expect(recorded).toHaveLength(2))
    await pressed(here, 'Take out: Retest date passed')
    await eventually(() => expect(recorded.map(({ kind }) => kind)).toEqual(['here', 'overdue', 'taken-out']))
    expect(here.text()).not.toContain('Take out: Retest')
    expect(here.findAll('button').map(button => button.text())).toContain('Retest date passed')
  })

  it('tells of the rest that is not there, and of one that nobody expected', async () => {
    const here = await begun()
    await found(here, '821')
    await pressed(here, 'All cylinders')
    await pressed(here, 'The last one is not here')
    await pressed(here, 'It is not here')
    await eventually(() => expect(recorded.map(({ kind }) => kind)).toEqual(['here', 'missing']))
    await pressed(here, 'One not on the papers')
    const form = here.findAll('dialog').find(dialog => dialog.text().includes('not on the papers'))!
    await form.get('input').setValue('ZZ-1')
    await form.findAll('button').find(button => button.text() === 'Tell of it')!.trigger('click')
    await eventually(() => expect(recorded[2]).toMatchObject({ kind: 'unexpected', said: { serial: 'ZZ-1', what: null, photoIds: [] } }))
    expect(here.text()).toContain('Not on the papers: serial ZZ-1')
  })
})

describe('a dock without a network', () => {
  it('keeps what is said over a closed page, opens from the phone, and sends it once and in order', async () => {
    let here = await begun()
    fault = 'unreached'
    await found(here, '821')
    await weighed(here, ['5', '0'], 'Enter 50.0 lb')
    await eventually(() => expect(status(here)).toBe('2 not sent'))
    expect(here.text()).toContain('not sent yet')
    here.unmount()

    here = await opened()
    expect(here.text()).toContain('1 of 2 here, 1 weighed')
    expect(status(here)).toBe('2 not sent')
    await eventually(() => expect(here.text()).toContain('Send 2'))
    expect(recorded).toEqual([])
    fault = null
    await pressed(here, 'Send 2')
    await eventually(() => expect(status(here)).toBe('all sent'))
    expect(recorded.map(({ kind }) => kind)).toEqual(['here', 'gross'])
    expect(requests).toHaveLength(1)
  })

  it('records an entry once whose answer was lost', async () => {
    const here = await begun()
    fault = 'lost'
    await found(here, '821')
    await eventually(() => expect(requests).toHaveLength(1))
    await eventually(() => expect(here.text()).toContain('Send 1'))
    fault = null
    await pressed(here, 'Send 1')
    await eventually(() => expect(status(here)).toBe('all sent'))
    expect(requests[0]).toEqual(requests[1])
    expect(recorded).toHaveLength(1)
  })

  it('leaves what was not sent to the next link of the same shipment, and nothing of the shipment to an ended one', async () => {
    let here = await begun()
    fault = 'unreached'
    await found(here, '821')
    await eventually(() => expect(here.text()).toContain('Send 1'))
    expect(status(here)).toBe('1 not sent')
    fault = 'ended'
    await pressed(here, 'Send 1')
    await eventually(() => expect(here.text()).toContain('This link opens nothing.'))
    expect(here.text()).toContain('1 not sent.')
    expect(here.text()).not.toContain('K-4821')
    const box = dockBox()
    expect(await box.copy(LINKS[0])).toMatchObject({ answer: null })
    box.close()
    here.unmount()
    here = await opened()
    await eventually(() => expect(here.text()).toContain('1 not sent.'))
    here.unmount()

    here = await begun(NEXT_TOKEN)
    await eventually(() => expect(recorded.map(({ kind }) => kind)).toEqual(['here']))
    await eventually(() => expect(status(here)).toBe('all sent'))
  })

  it('shows what is refused with its reason, and lets the rest through', async () => {
    const here = await begun()
    refuses = ({ kind }) => kind === 'overdue'
    await found(here, '821')
    await pressed(here, 'Retest date passed')
    await eventually(() => expect(here.text()).toContain('Not taken down'))
    expect(here.text()).toContain('Not on this shipment.')
    await weighed(here, ['5', '0'], 'Enter 50.0 lb')
    await eventually(() => expect(recorded.map(({ kind }) => kind)).toEqual(['here', 'gross']))
    await pressed(here, 'Put away: Retest date passed')
    await eventually(() => expect(here.text()).not.toContain('Not taken down'))
  })
})
