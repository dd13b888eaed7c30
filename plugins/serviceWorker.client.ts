import { useInstallationStore } from '~~/stores/installation'

/** Puts the application onto the device once the page stands, and keeps the browser's offer to install it for our own button. */
export default defineNuxtPlugin(() => {
  const installation = useInstallationStore()
  installation.listen()
  onNuxtReady(() => installation.register())
})
