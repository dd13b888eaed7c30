import { mountSuspended } from '@nuxt/test-utils/runtime'
import { describe, expect, it } from 'vitest'
import ActOwnerConsent from '~~/components/act/ActOwnerConsent.vue'
import CustomerBanked from '~~/components/customer/CustomerBanked.vue'
import JobChoice from '~~/components/job/JobChoice.vue'
import JobFills from '~~/components/job/JobFills.vue'
import JobForm from '~~/components/job/JobForm.vue'
import JobNoteCard from '~~/components/job/JobNoteCard.vue'
import JobTable from '~~/components/job/JobTable.vue'
import type { JobAnswer, JobFill, JobLine } from '~~/utils/contract/jobs'
import { allByRole, byRole } from '../../helpers/roles'

const line: JobLine = {
  id: 'j1', number: 12, customer: { id: 'f1', name: 'Ossory Foods' }, email: 'plant@ossory.example', site: '4 Quay Street', equipment: 'Chiller 2', refrigerant: 'R-22',
  charge: null, keeps: 'customer', opened: null, note: null, createdAt: '2026-07-01T15:00:00.000Z', createdBy: { id: 'p1', name: 'Tina' }, cylinders: 1, recoveredGrams: 5_670, notKnown: 0,
}
const fill: JobFill = {
  eventId: 'e1', cylinder: { id: 'c1', labelCode: '7K3M9Q2TX', serial: 'A1001' }, at: '2026-07-01T18:00:00.000Z', refrigerant: 'R-22', condition: null,
  grossBefore: { unit: 'kg', value: 12 }, grossAfter: { unit: 'kg', value: 20 }, netGrams: 8_000, uncertaintyGrams: 160, method: 'push-pull', reached: null,
  by: { id: 'p1', name: 'Tina', certification: 'Type II' }, supervisor: null, ownerId: 'f1', apart: null, corrected: false,
}
const job: JobAnswer = {
  ...line, fills: [fill], draws: [], required: { level: { unit: 'inHg-vacuum', value: 0 }, alternative: null, assumed: [], source: '40 CFR 82.156(a), Table 1' },
  cautions: [], issue: 1, corrections: [], notes: [],
}
const NOW = Date.parse('2026-07-02T12:00:00.000Z')
const reader = { unit: 'kg' as const, now: NOW, timeZone: 'America/Chicago', ownerName: (id: string | null) => id === null ? 'us' : 'Ossory Foods' }
const words = (root: Element) => root.textContent!.replaceAll('\u00A0', ' ').replace(/\s+/g, ' ')

function type(root: Element, label: string, value: string) {
  const box = byRole(root, 'textbox', label) as HTMLInputElement
  box.value = value
  box.dispatchEvent(new Event('input'))
}

function choose(root: Element, label: string, value: string) {
  const box = byRole(root, 'combobox', label) as HTMLSelectElement
  box.value = value
  box.dispatchEvent(new Event('change'))
}

describe('which job a fill is of', () => {
  const props = { chosenId: '', jobs: [line], customers: [{ id: 'f1', name: 'Ossory Foods' }], refrigerants: ['R-22'], refrigerant: 'R-22', mayMake: true, busy: false, problem: null, unit: 'lb' as const }

  it('is chosen from the newest, and says whose the refrigerant stays', async () => {
    const choice = await mountSuspended(JobChoice, { props })
    choose(choice.element, 'Job', 'j1')
    expect(choice.emitted('choose')).toEqual([['j1']])
    await choice.setProps({ chosenId: 'j1' })
    expect(words(choice.element)).toContain('4 Quay Street. The refrigerant stays with Ossory Foods.')
    expect(allByRole(choice.element, 'button')).toEqual([])
  })

  it('is made in place, with the word that this needs a connection, and only by who may', async () => {
    const choice = await mountSuspended(JobChoice, { props })
    byRole(choice.element, 'button', 'A new job').click()
    await choice.vm.$nextTick()
    expect(words(choice.element)).toContain('A new job needs a connection.')
    const form = choice.element.querySelector('form')!
    form.dispatchEvent(new Event('submit', { cancelable: true }))
    await choice.vm.$nextTick()
    expect(byRole(form, 'alert').textContent).toContain('Choose the customer.')
    choose(form, 'Customer', 'f1')
    type(form, 'Site', '4 Quay Street')
    type(form, 'Equipment', 'Chiller 3')
    await choice.vm.$nextTick()
    byRole(form, 'button', 'Stays with Ossory Foods').click()
    await choice.vm.$nextTick()
    form.dispatchEvent(new Event('submit', { cancelable: true }))
    expect(choice.emitted('make')).toEqual([[{ customerId: 'f1', site: '4 Quay Street', equipment: 'Chiller 3', keeps: 'customer', refrigerant: 'R-22' }]])
    expect(allByRole((await mountSuspended(JobChoice, { props: { ...props, mayMake: false } })).element, 'button')).toEqual([])
  })

  it('of somebody who is not on the list asks for the name', async () => {
    const form = await mountSuspended(JobForm, { props: { ...props, size: 'field' } })
    choose(form.element, 'Customer', 'by-name')
    await form.vm.$nextTick()
    type(form.element, 'The customer’s name', 'Fenwick Ice')
    await form.vm.$nextTick()
    expect(allByRole(form.element, 'button').map(button => button.textContent!.trim())).toContain('Stays with Fenwick Ice')
  })
})

describe('a list of jobs', () => {
  it('says what is not known as that, and what a phone\'s copy does not have', async () => {
    const table = await mountSuspended(JobTable, { props: { jobs: [line, { ...line, id: 'j2', recoveredGrams: null, notKnown: 1 }, { ...line, id: 'j3', recoveredGrams: null, cylinders: 0 }, { ...line, id: 'j5', recoveredGrams: null }, { ...line, id: 'j4', recoveredGrams: null, cylinders: null }], unit: 'kg', now: NOW, timeZone: 'UTC' } })
    const text = words(table.element)
    for (const part of ['5.67 kg', '– not known', '– nothing yet', '– nothing that counts', '– with the server']) expect(text).toContain(part)
  })
})

describe('what was recovered into a cylinder', () => {
  it('stands with its doubt, its owner and its technician', async () => {
    const fills = await mountSuspended(JobFills, { props: { ...reader, caption: 'What was recovered', fills: [fill] } })
    const text = words(fills.element)
    for (const part of ['8.00 kg ± 0.16 kg', 'Gross 12.00 kg before, 20.00 kg after; machine, push-pull', 'It belongs to Ossory Foods', 'By Tina, Type II']) expect(text).toContain(part)
    expect(byRole(fills.element, 'link', '7K3 M9Q 2TX').getAttribute('href')).toBe('/c/7k3m9q2tx')
  })

  it('says that nobody knows how much, that it is practice, and that the vacuum was not reached', async () => {
    const reached = { verdict: 'not-reached', because: 'It comes to 8 inHg.', shortBy: 2, absoluteMmHg: 500, heldMinutes: null } as const
    const fills = await mountSuspended(JobFills, { props: { ...reader, caption: 'Apart', fills: [{ ...fill, netGrams: null, uncertaintyGrams: null, apart: 'practice', reached, corrected: true }] } })
    const text = words(fills.element)
    for (const part of ['– not known', 'practice', 'corrected', 'Vacuum: Not reached', 'How long it held is not said.']) expect(text).toContain(part)
  })
})

describe('the note\'s card', () => {
  const props = { job, maySend: true, busy: false, problem: null, now: NOW, timeZone: 'UTC' }

  it('sends it to the customer by one button, and asks for an address where there is none', async () => {
    const card = await mountSuspended(JobNoteCard, { props })
    byRole(card.element, 'button', 'Send the note').closest('form')!.dispatchEvent(new Event('submit', { cancelable: true }))
    expect(card.emitted('send')).toEqual([['plant@ossory.example']])
    const without = await mountSuspended(JobNoteCard, { props: { ...props, job: { ...job, email: null } } })
    without.element.querySelector('form')!.dispatchEvent(new Event('submit', { cancelable: true }))
    await without.vm.$nextTick()
    expect(without.emitted('send')).toBeUndefined()
    expect(words(without.element)).toContain('Write the e-mail address that it goes to.')
    expect(byRole(card.element, 'link', 'Read it as a PDF').getAttribute('href')).toBe('/api/jobs/j1/recovery-note.pdf')
  })

  it('says that the customer has an older issue, and who only reads is offered no sending', async () => {
    const note = { issue: 1, recipient: 'plant@ossory.example', sentAt: '2026-07-01T19:00:00.000Z', sentBy: 'Tina', outcome: 'sent' as const }
    const corrected = { ...job, issue: 2, notes: [note], corrections: [{ eventId: 'e2', at: '2026-07-02T09:00:00.000Z', reason: 'wrong scale' }] }
    const card = await mountSuspended(JobNoteCard, { props: { ...props, job: corrected, maySend: false } })
    for (const part of ['The customer has an older issue.', 'wrong scale', 'Issue 1 to plant@ossory.example']) expect(words(card.element)).toContain(part)
    expect(allByRole(card.element, 'button')).toEqual([])
    const sent = await mountSuspended(JobNoteCard, { props: { ...props, job: { ...corrected, notes: [{ ...note, issue: 2 }] } } })
    expect(words(sent.element)).not.toContain('older issue')
  })
})

describe('a cylinder that is another\'s', () => {
  it('is asked about by the owner\'s name, our own is not', async () => {
    const asked = await mountSuspended(ActOwnerConsent, { props: { view: { ownership: 'customer', owner: { id: 'f1', name: 'Ossory Foods' } }, modelValue: false } })
    const tick = byRole(asked.element.parentElement!, 'checkbox', /Ossory Foods agrees that it is filled/) as HTMLInputElement
    tick.checked = true
    tick.dispatchEvent(new Event('change'))
    expect(asked.emitted('update:modelValue')).toEqual([[true]])
    expect((await mountSuspended(ActOwnerConsent, { props: { view: { ownership: 'own', owner: null }, modelValue: false } })).text()).toBe('')
  })
})

describe('what a customer has banked', () => {
  it('stands by refrigerant with its cylinders, and what was credited beside', async () => {
    const cylinder = { id: 'c1', labelCode: '7K3M9Q2TX', serial: 'A1001' }
    const banked = await mountSuspended(CustomerBanked, { props: {
      customer: 'Ossory Foods', unit: 'kg', now: NOW, timeZone: 'UTC',
      banked: {
        held: [{ refrigerant: 'R-22', condition: 'clean', grams: 6_000, uncertaintyGrams: 75, notKnown: 1, cylinders: [
          { ...cylinder, grams: 6_000, uncertaintyGrams: 75, isShared: true, since: '2026-07-01T18:00:00.000Z' },
          { id: 'c2', labelCode: null, serial: 'B7', grams: null, uncertaintyGrams: null, isShared: false, since: null },
        ] }],
        movements: [{ eventId: 'e1', ordinal: 0, cylinder, at: '2026-07-01T18:00:00.000Z', kind: 'filled', cause: 'recovered', refrigerant: 'R-22', grams: 6_000, apart: false }],
        movementsInAll: 1,
        shipped: [
          { eventId: 'e3', shipment: { id: 's1', number: 4 }, to: { id: 'r', name: 'Tarnvale Reclaim' }, cylinder, refrigerant: 'R-22', at: '2026-06-01T18:00:00.000Z', grams: 3_000, wholeGrams: 4_000, isSettled: true, creditCents: 12_345 },
          { eventId: 'e4', shipment: { id: 's2', number: 5 }, to: { id: 'r', name: 'Tarnvale Reclaim' }, cylinder, refrigerant: 'R-22', at: '2026-06-01T18:00:00.000Z', grams: 1_000, wholeGrams: 1_000, isSettled: false, creditCents: null },
        ],
      },
    } })
    const text = words(banked.element)
    for (const part of ['R-22, clean', '6.00 kg ± 0.08 kg', 'and 1 cylinder not weighed', 'two owners: to reclaim only', 'serial B7', 'since when is not known', '3.00 kg of 4.00 kg', '$123.45', '– not settled', '40 CFR 82.154(d)']) expect(text).toContain(part)
  })
})
