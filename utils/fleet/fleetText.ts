import { RULE_WORDS } from '../capacity/words'
import type { CylinderRow } from '../custody/cylinderView'
import { KIND_WORDS } from '../custody/words'
import { columnFigure } from '../quantity/columnFigure'
import { formatDay, wallClock } from '../quantity/instant'
import { formatMass, type MassUnit } from '../quantity/mass'
import { formatMonth } from '../quantity/month'
import { openListName } from '../shipment/openListName'
import { rowVerdict, type RowVerdict } from './rowVerdict'

/** One cylinder of the fleet in words and figures, as a table and a card show it. */
export interface FleetText {
  verdict: RowVerdict
  refrigerant: string
  /** Stands in the place of the bar where none can be drawn. */
  netReason: string
  rule: string
  /** Null where it is not known. */
  room: string | null
  stop: string | null
  retest: string
  retestState: 'overdue' | 'soon' | 'fine'
  place: string
  lastEvent: string
  lastDay: string
}

/** Who reads: the unit of that person's scale, the present instant and the zone in which days are counted. */
export interface Reader { unit: MassUnit, now: number, timeZone: string }

/** Says a row of the fleet to its reader. Rounding: net to the nearest division, limit, room and stop weight down. */
export function fleetText(row: CylinderRow, reader: Reader): FleetText {
  const { unit, now, timeZone } = reader
  return {
    verdict: rowVerdict(row),
    refrigerant: row.refrigerant ?? (row.nothingInIt ? 'none' : 'unknown'),
    netReason: netReason(row, unit),
    rule: row.governingRule ? shortRule(row.governingRule) : row.nothingInIt ? 'by refrigerant' : '–',
    room: row.roomGrams === null ? null : columnFigure(row.roomGrams, unit, 'down'),
    stop: row.exactStopWeightGrams === null ? null : columnFigure(row.exactStopWeightGrams, unit, 'down'),
    retest: row.dueMonth === null ? '–' : shortMonth(row.dueMonth),
    retestState: row.findingCodes.includes('retest-overdue') ? 'overdue' : row.findingCodes.includes('retest-soon') ? 'soon' : 'fine',
    place: [row.place?.name, row.holder?.name, row.openList && openListName(row.openList)].filter(Boolean).join(', ') || 'not known',
    lastEvent: row.lastEventKind ? KIND_WORDS[row.lastEventKind].done : 'no event',
    lastDay: row.lastEventAt ? `, ${dayOf(row.lastEventAt, timeZone, now)}` : '',
  }
}

/** A month as a column shows it. @example shortMonth('2027-03') // 'Mar 2027' */
export function shortMonth(month: string): string {
  const [name, year] = formatMonth(month).split(' ')
  return `${name!.slice(0, 3)} ${year}`
}

/** The day of an instant, with its year where it is not the present one. */
export function dayOf(instant: string, timeZone: string, now: number): string {
  const at = Date.parse(instant)
  const year = wallClock(at, timeZone).year
  const day = formatDay(at, timeZone)
  return year === wallClock(now, timeZone).year ? day : `${day} ${year}`
}

function netReason(row: CylinderRow, unit: MassUnit): string {
  if (row.nothingInIt) return 'nothing in it'
  if (row.netGrams === null) return '– not weighed'
  return `${formatMass(row.netGrams, unit, 'nearest')} net, no limit`
}

// In a narrow column the rule goes without what explains it.
function shortRule(rule: NonNullable<CylinderRow['governingRule']>): string {
  return RULE_WORDS[rule].replace(/^the /, '').split(',')[0]!
}
