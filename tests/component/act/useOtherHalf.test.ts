import { flushPromises } from '@vue/test-utils'
import { mountSuspended, registerEndpoint } from '@nuxt/test-utils/runtime'
import { describe, expect, it } from 'vitest'
import { useOtherHalf } from '~~/composables/useOtherHalf'
import type { LogLine } from '~~/utils/custody/cylinderView'

const OWN = { direction: 'out', counterpartId: 'taker', transferId: 'pair', refrigerant: 'R-22', condition: 'clean', grossAfter: { unit: 'kg', value: 15 } }
const OTHER = { direction: 'in', counterpartId: 'giver', transferId: 'pair', refrigerant: 'R-22', condition: 'clean', grossAfter: { unit: 'kg', value: 17 } }

function lineOf(id: string, details: object, more: object = {}): LogLine {
  return { id, version: 2, kind: 'transferred', details, correction: null, otherCylinder: { id: 'taker', labelCode: null, serial: 'T1' }, ...more } as LogLine
}

let log: LogLine[] = []
registerEndpoint('/api/cylinders/taker/events', () => ({ items: log, nextCursor: null, total: log.length, cylinder: { id: 'taker', labelCode: null, serial: 'T1', version: 7 } }))

async function correcting(correction: { takesOut: boolean, details: unknown }, own = lineOf(`own ${Math.random()}`, OWN)) {
  let other!: ReturnType<typeof useOtherHalf>
  await mountSuspended({
    setup() {
      other = useOtherHalf(() => own, () => correction)
      return () => null
    },
  })
  await flushPromises()
  return { offered: other.offered.value, usual: other.usual.value, correction: other.half.value && other.corrected('Read again') }
}

describe('the other half of a line that is corrected', () => {
  it('is corrected with it where both say the wrong refrigerant, and keeps its own weights', async () => {
    log = [lineOf('moved', {}, { kind: 'moved' }), lineOf('other', OTHER)]
    expect(await correcting({ takesOut: false, details: { ...OWN, refrigerant: 'R-410A' } })).toEqual({
      offered: true, usual: true,
      correction: { cylinderId: 'taker', kind: 'corrected', expects: 7, details: { eventId: 'other', reason: 'Read again', instead: { ...OTHER, refrigerant: 'R-410A' } } },
    })
  })

  it('is let alone where only a weight of this one was wrong', async () => {
    log = [lineOf('other', OTHER)]
    expect(await correcting({ takesOut: false, details: { ...OWN, grossAfter: { unit: 'kg', value: 14 } } })).toMatchObject({ offered: false, usual: false })
  })

  it('is offered, and not taken for meant, where it was the other that said something else already', async () => {
    log = [lineOf('other', OTHER, { instead: { ...OTHER, refrigerant: 'R-134a' } })]
    expect(await correcting({ takesOut: false, details: OWN })).toMatchObject({ offered: true, usual: false })
  })

  it('is taken out with it, unless it was taken out before', async () => {
    log = [lineOf('other', OTHER)]
    expect((await correcting({ takesOut: true, details: null })).correction?.details).toEqual({ eventId: 'other', reason: 'Read again' })
    log = [lineOf('other', OTHER, { correction: { eventId: 'x', reason: 'y', takenOut: true } })]
    expect(await correcting({ takesOut: true, details: null })).toMatchObject({ offered: false, correction: null })
  })
})
