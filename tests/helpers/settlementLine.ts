import type { SettlementLine } from '../../utils/contract/settlement'
import { NOTHING_SAID, type LineFigures } from '../../utils/settlement/figures'
import { fourWeights } from '../../utils/settlement/fourWeights'
import { cylinderRow } from './cylinderRow'

/** A line of a settlement that left at 18,144 g gross and 5,670 g net (40 lb and 12.5 lb) of clean R-22. */
export function settlementLine(id: string, figures: Partial<LineFigures> = {}, change: Partial<SettlementLine> = {}): SettlementLine {
  const sent = { grossGrams: 18_144, netGrams: 5_670, refrigerant: 'R-22', condition: 'clean' }
  const said = { ...NOTHING_SAID, ...figures }
  return {
    cylinder: cylinderRow({ id, serial: `S-${id}`, labelCode: null }), version: 4, sent, figures: said, isEntered: false,
    weights: fourWeights(sent, said), dock: null, photoIds: [], returnedAt: null, ...change,
  }
}
