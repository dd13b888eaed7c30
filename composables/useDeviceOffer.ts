import { useInstallationStore } from '~~/stores/installation'
import { usePostingStore } from '~~/stores/posting'

const ASKED_KEY = 'collarbook-install-asked'

const INSTALL = 'Keep Collarbook on the home screen: it opens without signal, and what is kept on this device is safer.'

/**
 * What the application has to offer for itself: a new version, and once, after the first recorded event, to be installed.
 *
 * It comes with a change of page, so that nothing moves under a finger: call it when one was changed to. In the browser only.
 */
export function useDeviceOffer() {
  const installation = useInstallationStore()
  const posting = usePostingStore()
  const router = useRouter()
  const shown = ref<'update' | 'install' | null>(null)
  const isPutOff = ref(false)

  const mayAskToInstall = () => posting.recorded > 0 && (installation.canInstall || installation.isByShareSheet) && !wasAsked()

  function choose() {
    if (installation.isUpdateReady && !isPutOff.value) shown.value = 'update'
    else shown.value = mayAskToInstall() ? 'install' : null
  }

  const offer = computed(() => {
    if (shown.value === 'update') return { text: 'A new version is ready.', action: 'Take it now' }
    if (shown.value === null) return null
    return installation.canInstall ? { text: INSTALL, action: 'Install' } : { text: `${INSTALL} In the browser: Share, then Add to Home Screen.`, action: null }
  })

  function take() {
    if (shown.value === 'update') return installation.takeUpdate()
    void installation.install()
    close()
  }

  function close() {
    if (shown.value === 'update') isPutOff.value = true
    else rememberAsked()
    shown.value = null
  }

  choose()
  const end = router.afterEach(choose)

  return { offer, take, close, end }
}

function wasAsked(): boolean {
  try {
    return localStorage.getItem(ASKED_KEY) !== null
  }
  catch {
    // Where nothing is remembered it would ask for ever.
    return true
  }
}

function rememberAsked() {
  try {
    localStorage.setItem(ASKED_KEY, 'yes')
  }
  catch {
    // Then wasAsked says so too.
  }
}
