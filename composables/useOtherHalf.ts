import { useApi } from '~~/composables/useApi'
import type { CustodyLogAnswer } from '~~/utils/contract/custody'
import type { LogLine } from '~~/utils/custody/cylinderView'
import { areHalvesOfOne, otherHalfMended, sayTheSame } from '~~/utils/custody/draft/pairHalf'
import { PAIRED_KINDS, type PairedKind } from '~~/utils/custody/kinds'

/** The correction of the other cylinder's half. */
interface OtherCorrection { cylinderId: string, kind: 'corrected', expects: number, details: { eventId: string, reason: string, instead?: Record<string, unknown> } }

/**
 * The other half of a line that is one half of what happened between two cylinders, and how it is corrected with it.
 *
 * Shape: `half` is null where the line has none in the log, or the log of the other is longer than a page; `offered`
 * whether there is something to correct in it, `usual` whether that is meant where nobody says otherwise.
 */
export function useOtherHalf(line: () => LogLine | null, correction: () => { takesOut: boolean, details: unknown }) {
  const api = useApi()
  const { data } = useAsyncData(`other-half-${line()?.id}`, async () => {
    const id = line()?.otherCylinder?.id
    return id ? await api.get<CustodyLogAnswer>(`/api/cylinders/${id}/events`, { limit: 200 }) : null
  })

  const half = computed(() => {
    const mine = line()
    return mine && isPaired(mine.kind) ? data.value?.items.find(other => areHalvesOfOne(mine, other) && !other.correction?.takenOut) ?? null : null
  })
  const kind = computed(() => line()?.kind as PairedKind)
  const differs = (from: LogLine) => !sayTheSame(kind.value, correction().details, from.instead ?? from.details)
  const offered = computed(() => half.value !== null && (correction().takesOut || (correction().details !== null && differs(half.value))))
  const usual = computed(() => correction().takesOut || (correction().details !== null && line() !== null && differs(line()!)))

  function corrected(reason: string): OtherCorrection {
    const { id, details, instead } = half.value!
    return {
      cylinderId: data.value!.cylinder.id,
      kind: 'corrected',
      expects: data.value!.cylinder.version,
      details: { eventId: id, reason, ...!correction().takesOut && { instead: otherHalfMended(kind.value, correction().details, instead ?? details) } },
    }
  }

  return { half, offered, usual, corrected }
}

function isPaired(kind: LogLine['kind']): kind is PairedKind {
  return (PAIRED_KINDS as readonly string[]).includes(kind)
}
