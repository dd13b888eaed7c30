import { useSessionStore } from '~~/stores/session'

/** The first visit's own page comes first: the copy is looked after once it stands. Units: milliseconds. */
const AFTER_PAGE_MS = 2_000

type Answers = typeof import('~~/composables/offlineAnswers')

/** Whoever is signed in has a copy of the firm on this device, which follows the server and answers in its place. */
export default defineNuxtPlugin((nuxt) => {
  nuxt.hook('app:mounted', () => {
    const session = useSessionStore()
    let timer: ReturnType<typeof setTimeout> | undefined
    watch(() => session.user?.id, (id) => {
      clearTimeout(timer)
      if (id !== undefined) timer = setTimeout(() => void begin(), AFTER_PAGE_MS)
    }, { immediate: true })
  })

  let isWatching = false

  async function begin() {
    const [{ useKitStore }, { usePostingStore }] = await Promise.all([import('~~/stores/kit'), import('~~/stores/posting')])
    await nuxt.runWithContext(async () => {
      const [kit, posting] = [useKitStore(), usePostingStore()]
      if (!isWatching) watch(() => posting.recorded, () => void kit.follow())
      isWatching = true
      await kit.start()
    })
  }

  /** What answers is fetched when it is first needed; where not even that is on the device, there is no copy either. */
  const answers = (): Promise<Answers | null> => import('~~/composables/offlineAnswers').catch(() => null)

  return {
    provide: {
      answerFromCopy: async (...question: Parameters<Answers['answerFromCopy']>): ReturnType<Answers['answerFromCopy']> => await (await answers())?.answerFromCopy(...question) ?? null,
      /** Has everything at hand that the next answer takes. */
      readyCopy: async (): Promise<void> => (await answers())?.readyCopy(),
    },
  }
})
