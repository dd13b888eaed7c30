import { mountSuspended, registerEndpoint } from '@nuxt/test-utils/runtime'
import { createError, readBody } from 'h3'
import { beforeEach, describe, expect, it, vi } from 'vitest'
import { nextTick } from 'vue'
import { clearNuxtData } from '#imports'
import RulesPage from '~~/pages/rules.vue'
import { useSessionStore } from '~~/stores/session'
import { DEFAULT_FILL_POLICY } from '~~/utils/capacity/types'
import type { NewRule, PolicyAnswer, RulePreview } from '~~/utils/contract/policy'
import type { User } from '~~/utils/contract/session'
import { DEFAULT_RETEST_SETTINGS } from '~~/utils/requalification/retestSettings'
import { newRulePreview } from '~~/utils/rules/rulePreview'
import { byRole } from '../../helpers/roles'

const MANAGER: User = { id: 'p', name: 'M. Sorrel', email: 'sorrel@firm.example', roles: ['manager'], trainee: false, certification: null, certificationType: null, certificationNumber: null, units: 'lb' }
const POLICY: PolicyAnswer = {
  asOf: 1_780_000_000_000, timeZone: 'America/Chicago', fillPolicies: [], retests: [], fillPolicy: DEFAULT_FILL_POLICY,
  retest: DEFAULT_RETEST_SETTINGS, rules: [], rowsBehind: 0, scales: [],
}

let sent: NewRule[] = []
let told: () => PolicyAnswer = () => POLICY
registerEndpoint('/api/session', () => ({ user: MANAGER }))
registerEndpoint('/api/policy', () => told())
registerEndpoint('/api/policy/preview', { method: 'POST', handler: (): RulePreview => newRulePreview(POLICY.asOf).answer() })
registerEndpoint('/api/policy', {
  method: 'POST',
  handler: async (event) => {
    sent.push(await readBody<NewRule>(event))
    // Whether it was set is not known: so it is when an answer is lost.
    throw createError({ statusCode: 503 })
  },
})

async function open() {
  const page = await mountSuspended(RulesPage, { route: '/rules', attachTo: document.body })
  const root = page.element.parentElement!
  const button = (name: string) => byRole(root, 'button', name)
  const field = (name: string) => byRole(root, 'textbox', name) as HTMLInputElement
  await vi.waitFor(() => expect(button('Set a fill rule')).toBeDefined())
  button('Set a fill rule').click()
  await vi.waitFor(() => field('Why'))
  const submit = (name: string) => button(name).closest('form')!.dispatchEvent(new Event('submit', { cancelable: true }))
  return {
    page,
    async type(name: string, text: string) {
      field(name).value = text
      field(name).dispatchEvent(new Event('input'))
      await nextTick()
    },
    field,
    async preview() {
      submit('Show what it changes')
      await vi.waitFor(() => expect(button('Set this rule')).toBeDefined())
    },
    async set() {
      const before = sent.length
      submit('Set this rule')
      await vi.waitFor(() => expect(sent).toHaveLength(before + 1))
      await vi.waitFor(() => expect(button('Set this rule').hasAttribute('disabled')).toBe(false))
    },
  }
}

describe('a rule whose answer was lost', () => {
  beforeEach(() => {
    sent = []
    useSessionStore().set(MANAGER)
  })

  it('is the same rule when it is sent again, and another one once something else is typed', async () => {
    const { page, type, preview, set } = await open()
    await type('Why', 'The vans stand in the sun')
    await preview()
    await set()
    await set()
    await type('Share of the cylinder', '75')
    await preview()
    await set()
    const ids = sent.map(rule => rule.id)
    expect(ids[1]).toBe(ids[0])
    expect(ids[2]).not.toBe(ids[0])
    page.unmount()
  })
})

describe('the form of a rule', () => {
  it('keeps what is typed where the connection is lost while rows still follow', async () => {
    useSessionStore().set(MANAGER)
    let asked = 0
    told = () => {
      asked++
      if (asked > 1) throw createError({ statusCode: 503 })
      return { ...POLICY, rowsBehind: 12 }
    }
    clearNuxtData('firm-rules-now')
    const { page, type, field } = await open()
    await type('Why', 'The vans stand in the sun')
    await vi.waitFor(() => expect(asked).toBeGreaterThan(2), { timeout: 5000 })
    expect(field('Why').value).toBe('The vans stand in the sun')
    page.unmount()
  })
})
