import { emptyDraft, readDraft, type RegistrationDraft } from '../../registration/draft'
import { impliedServicePressurePsig } from '../../requalification/specs'
import type { DetailsOf } from '../schema'
import type { DraftKind } from './draft'

/** The form that mends what was registered; a first registration has a page of its own. */
export const REGISTERED: DraftKind<'registered', RegistrationDraft> = {
  empty: emptyDraft,
  read: (draft, { thisMonth }) => {
    const read = readDraft(draft, thisMonth)
    return 'errors' in read
      ? { reason: Object.values(read.errors)[0] ?? 'Something is still open.' }
      : { details: read.details, placeId: draft.placeId }
  },
  of: (details, placeId) => ({
    ...emptyDraft(),
    ...stampInDraft(details.stamp),
    marks: (details.marks ?? []).map(mark => ({ month: mark.month, rin: mark.rin ?? '', suffix: mark.suffix ?? '' })),
    ownership: details.ownership,
    ownerId: details.ownerId ?? '',
    dedicatedTo: details.dedicatedTo ?? '',
    ...contentsInDraft(details.contents),
    gross: details.gross ?? null,
    placeId: placeId ?? '',
  }),
}

function stampInDraft(stamp: DetailsOf<'registered'>['stamp']): Partial<RegistrationDraft> {
  return {
    serial: stamp.serial ?? '',
    serialUnreadable: stamp.serial === null,
    maker: stamp.maker ?? '',
    spec: specAsStamped(stamp),
    tareWeight: stamp.tareWeight,
    tareIncludesValve: stamp.tareIncludesValve ?? null,
    waterCapacity: stamp.waterCapacity,
    made: stamp.madeMonth === null ? '' : stamp.madeMonth,
    flammableMarked: stamp.flammableMarked,
    floatSwitch: stamp.floatSwitch ?? null,
    valve: stamp.valve ?? '',
  }
}

function contentsInDraft(contents: DetailsOf<'registered'>['contents']): Partial<RegistrationDraft> {
  if (contents === undefined) return { contents: null }
  return typeof contents === 'string' ? { contents } : { contents: 'refrigerant', ...contents }
}

/** Specification and pressure run together, as on the collar; apart where the specification ends in a figure. */
function specAsStamped({ spec, servicePressurePsig }: DetailsOf<'registered'>['stamp']): string {
  if (servicePressurePsig === null || servicePressurePsig === impliedServicePressurePsig(spec)) return spec
  return /\d$/.test(spec) ? `${spec}-${servicePressurePsig}` : `${spec}${servicePressurePsig}`
}
