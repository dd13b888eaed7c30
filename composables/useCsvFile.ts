import { useAttempt } from '~~/composables/useAttempt'

/** Saves what a route answers as a table of values. */
export function useCsvFile() {
  const { busy, problem, attempt } = useAttempt()

  function save(path: string, query: Record<string, unknown>, fileName: string) {
    return attempt(async () => {
      const csv = await $fetch<Blob>(path, { query, headers: { accept: 'text/csv' }, responseType: 'blob', retry: false })
      const link = document.createElement('a')
      link.href = URL.createObjectURL(csv)
      link.download = fileName
      link.click()
      // The browser has taken it by the next turn.
      setTimeout(() => URL.revokeObjectURL(link.href))
    })
  }

  return { busy, problem, save }
}
