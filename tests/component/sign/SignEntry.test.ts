import { mountSuspended } from '@nuxt/test-utils/runtime'
import { describe, expect, it } from 'vitest'
import SignEntry from '~~/components/sign/SignEntry.vue'
import type { WaitingEntry } from '~~/utils/contract/countersigning'
import { byRole } from '../../helpers/roles'

const TRAINEE = { id: 't', name: 'P. Trainee' }
const at = '2026-07-14T15:20:00Z'

// 20.0 lb is 9,072 g, 27.0 lb is 12,247 g: 7.0 lb more.
const ENTRY: WaitingEntry = {
  cylinder: { id: 'c', labelCode: '7K3M9Q2TX', serial: 'K48213' },
  line: {
    id: 'e', seq: 7, version: 2, kind: 'filled', occurredAt: at, effectiveAt: at, recordedAt: at, clockSkewSeconds: 0,
    author: TRAINEE, postedBy: TRAINEE, supervisor: { id: 's', name: 'S. Supervisor' }, place: null, note: 'at the creamery', practice: false, confirmed: [],
    details: { refrigerant: 'R-410A', grossAfter: { unit: 'lb', value: 54.5 } }, names: {}, otherCylinder: null, netBeforeGrams: 9072, netAfterGrams: 12_247,
    findings: [
      { code: 'unsigned', severity: 'caution', text: 'waits', source: '', since: null },
      { code: 'look-before-fill', severity: 'caution', text: 'not looked at', source: '', since: null },
    ],
    correction: null, signature: { by: null },
  } as WaitingEntry['line'],
}

const mount = async (more: object = {}) => (await mountSuspended(SignEntry, {
  props: { entry: ENTRY, unit: 'lb', timeZone: 'America/Phoenix', nowMs: Date.parse('2026-07-20T12:00:00Z'), refusal: null, modelValue: false, ...more },
}))
const textOf = async (more: object = {}) => (await mount(more)).text().replaceAll('\u00A0', ' ')

describe('an entry that waits for a signature', () => {
  it('shows all that is signed: what was done, by whom, the scale, the change, the note and what was found', async () => {
    const text = await textOf()
    for (const part of ['Filled', '7K3 M9Q 2TX', 'R-410A recovered', 'P. Trainee', 'at the creamery', '54.5 lb', '+7.0 lb', '27.0 lb', 'not looked at']) expect(text).toContain(part)
    expect(text).not.toContain('not countersigned')
  })

  it('leads to the log of its cylinder', async () => {
    expect(byRole((await mount()).element as HTMLElement, 'link', /7K3 M9Q 2TX/).getAttribute('href')).toBe('/c/7k3m9q2tx/log')
  })

  it('is ticked by whoever answers for it, and says why it was not signed', async () => {
    const shown = await mount()
    await shown.find('input[type=checkbox]').setValue(true)
    expect(shown.emitted('update:modelValue')).toEqual([[true]])
    expect(await textOf({ refusal: 'Only the supervisor whom the entry names signs it.' })).toContain('Only the supervisor whom the entry names signs it.')
  })

  it('says that it was practice', async () => {
    expect(await textOf()).not.toContain('practice')
    expect(await textOf({ entry: { ...ENTRY, line: { ...ENTRY.line, practice: true } } })).toContain('practice')
  })
})
