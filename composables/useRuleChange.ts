import { v7 as uuidv7 } from 'uuid'
import { useApi } from '~~/composables/useApi'
import { useAttempt } from '~~/composables/useAttempt'
import type { FirmRule, RuleDraft, RulePreview } from '~~/utils/contract/policy'

/**
 * The setting and withdrawing of the firm's rules: the form that is open, what its draft would change, and what the server said.
 *
 * `done` hears what was done, in words.
 */
export function useRuleChange(done: (said: string) => Promise<unknown>) {
  const api = useApi()
  const { busy, problem, attempt } = useAttempt()
  const setting = ref<FirmRule['kind'] | null>(null)
  const preview = shallowRef<RulePreview | null>(null)
  const withdrawing = shallowRef<FirmRule | null>(null)
  // One id to one content: sent again it sets nothing twice, and what was changed since is another rule.
  let sent = { content: '', id: '' }
  let turn = 0

  function open(kind: FirmRule['kind'] | null) {
    setting.value = kind
    forgetPreview()
    problem.value = null
    sent = { content: '', id: '' }
  }

  async function showChange(draft: RuleDraft) {
    const mine = ++turn
    await attempt(async () => {
      const shown = await api.post<RulePreview>('/api/policy/preview', draft)
      if (mine === turn) preview.value = shown
    })
  }

  /** What was typed has changed: a preview of what stood there before is none any more, not even one on its way. */
  function forgetPreview() {
    turn++
    preview.value = null
  }

  async function save(draft: RuleDraft, reason: string) {
    const content = JSON.stringify([draft, reason])
    if (content !== sent.content) sent = { content, id: uuidv7() }
    if (!await attempt(() => api.post('/api/policy', { id: sent.id, ...draft, reason }))) return
    open(null)
    await done(draft.from ? 'The rule is set and begins on its day.' : 'The rule is set and in force.')
  }

  function askWithdrawal(rule: FirmRule) {
    withdrawing.value = rule
    problem.value = null
  }

  async function withdraw(rule: FirmRule, reason: string) {
    const isDone = await attempt(() => api.post(`/api/policy/${rule.id}/withdraw`, { reason }))
    withdrawing.value = null
    if (isDone) await done('The rule is withdrawn. The history keeps it.')
  }

  return { busy, problem, setting, preview, withdrawing, open, showChange, forgetPreview, save, askWithdrawal, withdraw }
}
