import { mountSuspended } from '@nuxt/test-utils/runtime'
import { describe, expect, it } from 'vitest'
import PastBand from '~~/components/past/PastBand.vue'
import PastChoice from '~~/components/past/PastChoice.vue'

const PAST = { asOf: '2026-06-01T15:30:00.000Z', knownAt: null }
const NOW = Date.UTC(2026, 6, 1)

describe('choosing an instant of the past', () => {
  it('asks by what had happened, or by what was known, in the clock of the device', async () => {
    const form = await mountSuspended(PastChoice, { props: { past: null, latest: '2026-07-01T00:00' } })
    await form.get('input').setValue('2026-06-01T09:30')
    await form.get('form').trigger('submit')
    const instant = new Date('2026-06-01T09:30').toISOString()
    expect(form.emitted('choose')).toEqual([[{ asOf: instant, knownAt: null }]])
    await form.findAll('button').find(button => button.text().includes('What was known'))!.trigger('click')
    await form.get('form').trigger('submit')
    expect(form.emitted('choose')![1]).toEqual([{ asOf: null, knownAt: instant }])
  })

  it('wants a day and a time', async () => {
    const form = await mountSuspended(PastChoice, { props: { past: null, latest: '' } })
    await form.get('form').trigger('submit')
    expect(form.emitted('choose')).toBeUndefined()
    expect(form.text()).toContain('Choose a day and a time.')
  })

  it('begins with the instant that is shown', async () => {
    const form = await mountSuspended(PastChoice, { props: { past: PAST, latest: '' } })
    expect(new Date((form.get('input').element as HTMLInputElement).value).toISOString()).toBe(PAST.asOf)
  })
})

describe('the band of the past', () => {
  it.each([
    [PAST, 'As it stood 1 Jun 10:30', 'late entries and corrections are in it'],
    [{ asOf: null, knownAt: PAST.asOf }, 'As it was known 1 Jun 10:30', 'What was recorded later is not in it'],
    [{ asOf: PAST.asOf, knownAt: '2026-06-02T15:30:00Z' }, 'As it stood 1 Jun 10:30, as known 2 Jun 10:30', 'happened or was recorded later'],
  ])('names the instant and what is in it: %o', async (past, title, what) => {
    const band = await mountSuspended(PastBand, { props: { past, timeZone: 'America/Chicago', nowMs: NOW } })
    expect(band.text()).toContain(title)
    expect(band.text()).toContain(what)
    await band.get('button').trigger('click')
    expect(band.emitted('leave')).toHaveLength(1)
  })
})
