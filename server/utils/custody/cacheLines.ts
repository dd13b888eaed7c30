import type { FoldResult } from '../../../utils/custody/fold'
import type { Movement } from '../../../utils/custody/movement'
import type { StockChange } from '../../../utils/custody/stockChange'
import type { CacheChange, Columns } from './cacheChanges'

/** What one part of a cylinder's caches loses and gets. */
export type Lines = Pick<CacheChange, 'cleared' | 'added'>

/** The books: movements, and changes of stock. All of the cylinder's anew, unless only the new events' were folded. */
export function books(cylinderId: string, { movements, stockChanges }: FoldResult, isContinued = false): Lines {
  return {
    cleared: isContinued ? [] : ['movements', 'stock_changes'],
    added: {
      movements: movements.map(one => movementLine(cylinderId, one)),
      stock_changes: stockChanges.map(one => stockLine(cylinderId, one)),
    },
  }
}

/** The codes that the cylinder's `labelled` events claim. */
export function claims(cylinderId: string, { labelClaims }: FoldResult, isContinued = false): Lines {
  return {
    cleared: isContinued ? [] : ['label_claims'],
    added: {
      label_claims: labelClaims.map(claim => ({
        event_id: claim.eventId, code: claim.code, cylinder_id: cylinderId, effective_at: claim.effectiveAt, device_id: claim.deviceId, device_seq: claim.deviceSeq,
      })),
    },
  }
}

/** The halves of what happened between two cylinders, in order of effect. */
export function halfLines(cylinderId: string, { state }: FoldResult): Lines {
  return {
    cleared: ['halves'],
    added: { halves: state.halves.map((half, position) => ({ event_id: half.eventId, cylinder_id: cylinderId, other_id: half.otherId, position, half: JSON.stringify(half) })) },
  }
}

function movementLine(cylinderId: string, one: Movement): Columns {
  return {
    cylinder_id: cylinderId, event_id: one.eventId, ordinal: one.ordinal, cause: one.cause, refrigerant: one.refrigerant, owner_id: one.ownerId,
    grams: one.grams, at: one.at, apart: Number(one.apart),
  }
}

function stockLine(cylinderId: string, one: StockChange): Columns {
  return {
    cylinder_id: cylinderId, event_id: one.eventId, ordinal: one.ordinal, refrigerant: one.refrigerant, owner_id: one.ownerId, grams: one.grams,
    not_known: one.notKnown, weighed_variance: one.weighedVariance, found_variance: one.foundVariance,
    weighed_together: one.weighedTogether, found_together: one.foundTogether, at: one.at, apart: Number(one.apart),
  }
}
