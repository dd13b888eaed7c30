import type { LogDamage } from '../../../utils/contract/log'
import { DAMAGE_WORDS, type DamageKind } from '../../../utils/proof/damage'

/** Where something is wrong; what does not apply is left out. */
type Where = Partial<Pick<LogDamage, 'cylinderId' | 'version' | 'seq' | 'checkpoint'>>

/** As many are told one by one; the others are only counted. */
const MOST_TOLD = 50

/** What verifying has found so far. */
export interface DamageList {
  add: (kind: DamageKind, where: Where) => void
  told: () => LogDamage[]
  count: () => number
}

/** A list of damage with nothing in it. */
export function damageList(): DamageList {
  const told: LogDamage[] = []
  let count = 0
  return {
    add(kind, where) {
      count++
      if (told.length < MOST_TOLD) told.push({ cylinderId: null, version: null, seq: null, checkpoint: null, ...where, kind, because: DAMAGE_WORDS[kind] })
    },
    told: () => told,
    count: () => count,
  }
}
