/**
 * The present instant, the same on the server and in the first drawing of the browser, then kept up to the minute.
 *
 * Units: UTC milliseconds.
 */
export function useClock() {
  const now = useState('clock', () => Date.now())
  let timer: ReturnType<typeof setInterval> | undefined
  onMounted(() => {
    now.value = Date.now()
    timer = setInterval(() => {
      now.value = Date.now()
    }, 30_000)
  })
  onBeforeUnmount(() => clearInterval(timer))
  return readonly(now)
}
