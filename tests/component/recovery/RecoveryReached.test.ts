import { mountSuspended } from '@nuxt/test-utils/runtime'
import { expect, it } from 'vitest'
import RecoveryReached from '~~/components/recovery/RecoveryReached.vue'
import { judgeLevel } from '~~/utils/recovery/judgeLevel'
import { gaugeFor, reachedDraft, readReached, type ReachedDraft } from '~~/utils/recovery/reachedDraft'
import type { EvacuationLevel } from '~~/utils/recovery/types'
import { allByRole, byRole } from '../../helpers/roles'

function mounted(level: EvacuationLevel, draft: ReachedDraft, alternative: EvacuationLevel | null = null) {
  const required = { level, alternative }
  const read = readReached(draft, gaugeFor(draft, level), { unit: 'kg', value: 1 })
  const verdict = judgeLevel(required, read.reached, read.heldMinutes)
  return mountSuspended(RecoveryReached, { props: { modelValue: draft, unit: 'kg', required, read, verdict, isChargeKnown: true } })
}

const TEN: EvacuationLevel = { unit: 'inHg-vacuum', value: 10 }
const typed = (figure: string, more: Partial<ReachedDraft> = {}): ReachedDraft => ({ ...reachedDraft({}), figure, ...more })

function said(wrapper: Awaited<ReturnType<typeof mounted>>): string {
  return wrapper.find('[role=status]:not(output)').text()
}

it('says what is short, and how long it held', async () => {
  const text = said(await mounted(TEN, typed('9.5', { held: '5' })))
  expect(text).toContain('Not reached, 0.5 inHg short')
  expect(text).toContain('It held for 5 minutes.')
})

it('says that the level was reached, and that nobody said for how long', async () => {
  const text = said(await mounted(TEN, typed('10')))
  expect(text).toMatch(/^Reached/)
  expect(text).toContain('How long it held is not said.')
})

it('judges nothing before something is read', async () => {
  expect(said(await mounted(TEN, reachedDraft({})))).toContain('Not judged yet')
})

it('names the field that cannot be read', async () => {
  const wrapper = await mounted(TEN, typed('33'))
  expect(byRole(wrapper.element, 'textbox', 'Gauge shows').getAttribute('aria-invalid')).toBe('true')
  expect(said(wrapper)).toContain('Not judged yet')
})

it('takes what came out of a small appliance by weight, or its vacuum instead', async () => {
  const wrapper = await mounted({ unit: 'percent-of-charge', value: 90 }, reachedDraft({}), { unit: 'inHg-vacuum', value: 4 })
  expect(allByRole(wrapper.element, 'group', 'Recovered')).toHaveLength(1)
  expect(byRole(wrapper.element, 'button', 'By weight').getAttribute('aria-pressed')).toBe('true')
  expect(allByRole((await mounted(TEN, reachedDraft({}))).element, 'button', 'By weight')).toHaveLength(0)
})

it('keeps the gauge it was typed for', async () => {
  const draft = reachedDraft({})
  const wrapper = await mounted({ unit: 'mmHg-absolute', value: 25 }, draft)
  const field = byRole(wrapper.element, 'textbox', 'Gauge shows') as HTMLInputElement
  field.value = '24'
  field.dispatchEvent(new Event('input'))
  expect(draft).toMatchObject({ gauge: 'mmHgAbsolute', figure: '24' })
})
