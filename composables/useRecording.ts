import { usePreview, type PreviewContent } from '~~/composables/usePreview'
import type { NewEvent, Posted } from '~~/stores/posting'

/**
 * The way from a filled form to the log: what would be found is shown first, and what asks to be looked at is recorded
 * once it was seen.
 *
 * Shape: `reason` is what the form still lacks, `tick` what to do about findings that ask; `refusal` is either, once
 * recording was tried.
 */
export function useRecording(input: {
  content: () => (PreviewContent & Omit<NewEvent, 'occurredAt'>) | null
  at: () => string
  reason: () => string | null
  tick: string
  send: (content: Omit<NewEvent, 'occurredAt'>) => Promise<Posted | null>
}) {
  const { findings, asks, changes } = usePreview({ content: input.content, at: input.at })
  const seen = ref(false)
  const tried = ref(false)
  const codes = computed(() => findings.value.map(finding => finding.code))
  watch(() => codes.value.join(), () => {
    seen.value = false
  })

  const blocked = computed(() => input.reason() ?? (asks.value && !seen.value ? input.tick : null))
  const refusal = computed(() => tried.value ? blocked.value : null)

  async function record(): Promise<Posted | null> {
    tried.value = true
    const content = input.content()
    if (blocked.value || !content) return null
    const confirmed = seen.value ? codes.value : []
    const posted = await input.send({ ...content, ...(confirmed.length && { confirmed }) })
    window.scrollTo({ top: 0 })
    return posted
  }

  return { findings, asks, changes, seen, tried, blocked, refusal, record }
}
