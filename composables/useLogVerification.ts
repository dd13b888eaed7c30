import { ApiError } from '~~/composables/useApi'
import { useAttempt } from '~~/composables/useAttempt'
import type { LogVerification, VerifyProgress, VerifyScope } from '~~/utils/contract/log'
import type { ProblemDetails } from '~~/utils/contract/problem'
import { jsonLines } from '~~/utils/proof/jsonLines'

const BROKEN_OFF: ProblemDetails = { type: 'about:blank', title: 'Broken off', status: 0, detail: 'The server stopped before it was through. Verify again.' }

/** Verifies the custody log and follows how far that has come. */
export function useLogVerification() {
  const { busy, problem, attempt } = useAttempt()
  const scope = ref<VerifyScope>('all')
  const progress = ref<VerifyProgress | null>(null)
  const result = ref<LogVerification | null>(null)

  function verify(asked: VerifyScope) {
    scope.value = asked
    progress.value = null
    result.value = null
    return attempt(async () => {
      const response = await fetch(`/api/log/verify?scope=${asked}`, { headers: { Accept: 'application/x-ndjson' } })
      if (!response.ok) throw new ApiError(await response.json() as ProblemDetails)
      await follow(response.body!.pipeThrough(new TextDecoderStream()).getReader())
    })
  }

  async function follow(reader: ReadableStreamDefaultReader<string>) {
    const take = jsonLines()
    for (let piece = await reader.read(); !piece.done; piece = await reader.read()) {
      for (const line of take(piece.value) as (VerifyProgress | { result: LogVerification })[]) {
        if ('result' in line) result.value = line.result
        else progress.value = line
      }
    }
    if (!result.value) throw new ApiError(BROKEN_OFF)
  }

  return { busy, problem, scope, progress, result, verify }
}
