import { describe, expect, it } from 'vitest'
import { EMPTIED } from '../../../../../utils/custody/draft/emptied'
import { FILLED, NOT_KNOWN, OTHER_METHOD } from '../../../../../utils/custody/draft/filled'
import { LABELLED } from '../../../../../utils/custody/draft/labelled'
import { lastGross } from '../../../../../utils/custody/draft/lastGross'
import { MOVED } from '../../../../../utils/custody/draft/moved'
import { REGISTERED } from '../../../../../utils/custody/draft/registered'
import type { DraftContext } from '../../../../../utils/custody/draft/draft'
import type { LogLine } from '../../../../../utils/custody/cylinderView'
import { DETAILS } from '../../../../../utils/custody/schema'
import { fold } from '../../../../../utils/custody/fold'
import { view } from '../../../../../utils/custody/view'
import { filled, FOLD_CONTEXT, kg, recorded, registered, SHOP, STAMP, TECHNICIAN, VAN, VIEW_CONTEXT, type Told } from '../../../../helpers/custody'

function contextOf(story: Told[], more: Partial<DraftContext> = {}): DraftContext {
  return {
    view: view(fold(recorded(...story), FOLD_CONTEXT).state, VIEW_CONTEXT),
    unit: 'kg', personId: TECHNICIAN, thisMonth: '2026-07', asked: null, lastGross: null,
    places: [
      { id: SHOP, name: 'Shop', kind: 'shop', firmId: null, technicianId: null },
      { id: VAN, name: 'Van', kind: 'van', firmId: null, technicianId: TECHNICIAN },
    ],
    ...more,
  }
}

describe('the form of a recovery', () => {
  it('begins with what the cylinder holds, whatever was asked about', () => {
    expect(FILLED.empty(contextOf([registered(), filled('R-22', 20)], { asked: 'R-410A' })).refrigerant).toBe('R-22')
  })

  it('begins with the refrigerant asked about while nothing is in it', () => {
    expect(FILLED.empty(contextOf([registered()], { asked: 'R-410A' })).refrigerant).toBe('R-410A')
  })

  it('tells "not chosen" from "not known"', () => {
    const context = contextOf([registered()])
    const draft = { ...FILLED.empty(context), grossAfter: kg(20) }
    expect(FILLED.read(draft, context)).toEqual({ reason: 'Choose the refrigerant that went in.' })
    expect(FILLED.read({ ...draft, refrigerant: NOT_KNOWN }, context)).toEqual({ details: { refrigerant: null, grossAfter: kg(20) } })
  })

  it('leaves out what was not said, so that nothing is made up', () => {
    const context = contextOf([registered()])
    expect(FILLED.read({ ...FILLED.empty(context), refrigerant: 'R-22', grossAfter: kg(0) }, context)).toEqual({ details: { refrigerant: 'R-22', grossAfter: kg(0) } })
  })
})

describe('what was noted while a cylinder was filled', () => {
  const context = contextOf([registered()])
  const onTheWay = { readings: [{ at: '2026-07-01T10:00:00-05:00', gross: kg(18) }], purged: true as const, reached: { vacuum: { inHg: 0 }, heldMinutes: 0 } }
  const details = { refrigerant: 'R-22', grossAfter: kg(20), ...onTheWay }

  it('goes into the log with the weights, and a correction of the weights leaves it as it was', () => {
    expect(FILLED.read({ ...FILLED.empty(context), refrigerant: 'R-22', grossAfter: kg(20), onTheWay }, context)).toEqual({ details })
    expect(FILLED.read({ ...FILLED.of(details, null, 'kg'), grossAfter: kg(21) }, context)).toEqual({ details: { ...details, grossAfter: kg(21) } })
    expect(FILLED.of({ refrigerant: 'R-22', grossAfter: kg(20) }, null, 'kg').onTheWay).toEqual({})
  })
})

describe('the method of a recovery', () => {
  const context = contextOf([registered()])
  const draft = { ...FILLED.empty(context), refrigerant: 'R-22', grossAfter: kg(20) }
  const details = { refrigerant: 'R-22', grossAfter: kg(20) }

  it('is one with a name, or a line of one’s own', () => {
    expect(FILLED.read({ ...draft, method: 'push-pull' }, context)).toEqual({ details: { ...details, method: 'push-pull' } })
    expect(FILLED.read({ ...draft, method: OTHER_METHOD, otherMethod: ' by gravity ' }, context)).toEqual({ details: { ...details, method: 'by gravity' } })
    expect(FILLED.read({ ...draft, method: OTHER_METHOD }, context)).toHaveProperty('reason')
    expect(FILLED.read({ ...draft, otherMethod: 'left behind' }, context)).toEqual({ details })
  })

  it('of an older record stands in its form as it was written', () => {
    expect(FILLED.of({ ...details, method: 'machine' }, null, 'kg')).toMatchObject({ method: OTHER_METHOD, otherMethod: 'machine' })
    expect(FILLED.of({ ...details, method: 'own-compressor' }, null, 'kg')).toMatchObject({ method: 'own-compressor', otherMethod: '' })
    expect(FILLED.of(details, null, 'kg')).toMatchObject({ method: '', otherMethod: '' })
  })
})

describe('the form of a move', () => {
  it('gives the cylinder to the technician of the van, and to nobody at a shop', () => {
    const context = contextOf([registered()])
    expect(MOVED.read({ toPlaceId: VAN }, context)).toEqual({ details: { toPlaceId: VAN, toHolderId: TECHNICIAN } })
    expect(MOVED.read({ toPlaceId: SHOP }, context)).toEqual({ details: { toPlaceId: SHOP } })
  })
})

describe('the form of emptying', () => {
  const context = contextOf([registered()])
  const open = EMPTIED.empty(context)

  it('takes 0 microns as a vacuum and an empty field as none', () => {
    expect(EMPTIED.read({ ...open, level: '0' }, context)).toEqual({ details: { vacuum: { microns: 0 } } })
    expect(EMPTIED.read(open, context)).toHaveProperty('reason')
    expect(EMPTIED.read({ ...open, grossAfter: kg(12) }, context)).toEqual({ details: { grossAfter: kg(12) } })
  })

  it('asks again where a figure can be read in two ways', () => {
    expect(EMPTIED.read({ ...open, level: '1,000' }, context)).toHaveProperty('reason')
  })

  it('carries the barometer of an inHg gauge', () => {
    expect(EMPTIED.read({ ...open, gauge: 'inHg', level: '27.1', barometer: '27.9' }, context))
      .toEqual({ details: { vacuum: { inHg: 27.1, barometerInHg: 27.9 } } })
  })
})

describe('the form of a label', () => {
  it('takes the code as a person writes it, and no code whose check is wrong', () => {
    const context = contextOf([registered()])
    const draft = LABELLED.empty(context)
    expect(LABELLED.read({ ...draft, code: '7k3 m9q 2tx' }, context)).toEqual({ details: { code: '7K3M9Q2TX' } })
    expect(LABELLED.read({ ...draft, code: '7k3 m9q 2ty' }, context)).toHaveProperty('reason')
  })
})

describe('a recorded registration in its form', () => {
  it('comes out of it as it went in', () => {
    const details = DETAILS.registered.parse({
      stamp: { ...STAMP, maker: 'Q', madeMonth: '1998-11', floatSwitch: true },
      marks: [{ month: '2024-05', rin: 'A123' }], ownership: 'own', contents: { refrigerant: 'R-22', condition: 'suspect' }, gross: kg(20),
    })
    const context = contextOf([registered()])
    expect(REGISTERED.read(REGISTERED.of(details, SHOP, 'lb'), context)).toEqual({ details, placeId: SHOP })
    const withoutValve = { ...details, stamp: { ...details.stamp, tareIncludesValve: false } }
    expect(REGISTERED.read(REGISTERED.of(withoutValve, SHOP, 'lb'), context)).toEqual({ details: withoutValve, placeId: SHOP })
  })
})

describe('the last weighing that is offered', () => {
  const line = (details: object, more: Partial<LogLine> = {}) => ({ details, correction: null, ...more }) as LogLine

  it('is the reading as entered, where it still tells what is in it', () => {
    const { view: shown } = contextOf([registered(), filled('R-22', 20)])
    expect(lastGross(shown, [line({ toPlaceId: VAN }), line({ grossAfter: kg(20) })])).toEqual(kg(20))
    expect(lastGross(shown, [line({ grossAfter: kg(19.9) })])).toBeNull()
  })

  it('is no reading that was corrected', () => {
    const { view: shown } = contextOf([registered(), filled('R-22', 20)])
    expect(lastGross(shown, [line({ grossAfter: kg(20) }, { correction: { eventId: 'x', reason: 'slip', takenOut: true } })])).toBeNull()
  })

  it('is none while the contents are only reckoned', () => {
    const { view: shown } = contextOf([registered()])
    expect(lastGross(shown, [line({ gross: kg(12) })])).toBeNull()
  })
})
