import { RULE_WORDS } from '../capacity/words'
import type { FleetColumn } from '../contract/fleetLayout'
import type { CylinderRow } from '../custody/cylinderView'
import { CONDITION_WORDS, KIND_WORDS, LIFECYCLE_WORDS } from '../custody/words'
import { formatLabelCode } from '../label/code'
import { csvText } from '../picture/csvText'
import { formatFigure, type MassRounding, type MassUnit } from '../quantity/mass'
import { FLEET_COLUMN_WORDS } from './fleetColumns'
import { rowVerdict } from './rowVerdict'

/** A cell of a table of values: nothing where it is not known. */
type Cell = string | number | null

/** In a table of values pounds and ounces would be two figures in one cell: they are written as pounds. */
type CsvUnit = 'lb' | 'kg'

/** The heads of a table of values with these columns; each mass names its unit. */
export function fleetCsvHeads(columns: readonly FleetColumn[], unit: MassUnit): string[] {
  const of = csvUnit(unit)
  return columns.flatMap((column) => {
    if (column === 'net') return [`Net, ${of}`, `Fill limit, ${of}`]
    if (column === 'last') return ['Last event', 'Last event at']
    const { head, isMass } = FLEET_COLUMN_WORDS[column]
    return [isMass ? `${head}, ${of}` : head]
  })
}

/**
 * One cylinder as a row under {@link fleetCsvHeads}.
 *
 * Units: masses in the heads' unit; months YYYY-MM, instants ISO 8601.
 * Rounding: net and tare to the nearest division; limit, room and stop weight down, also below zero.
 */
export function fleetCsvRow(row: CylinderRow, columns: readonly FleetColumn[], unit: MassUnit): Cell[] {
  return columns.flatMap(column => cells(row, column, csvUnit(unit))).map(cell => typeof cell === 'string' ? csvText(cell) : cell)
}

function cells(row: CylinderRow, column: FleetColumn, unit: CsvUnit): Cell[] {
  switch (column) {
    case 'code': return [row.labelCode && formatLabelCode(row.labelCode)]
    case 'verdict': return [rowVerdict(row).text]
    case 'refrigerant': return [row.refrigerant ?? (row.nothingInIt ? 'none' : 'unknown')]
    case 'net': return [figure(row.netGrams, unit, 'nearest'), figure(row.fillLimitGrams, unit, 'down')]
    case 'rule': return [row.governingRule ? RULE_WORDS[row.governingRule] : row.nothingInIt ? 'by refrigerant' : null]
    case 'room': return [figure(row.roomGrams, unit, 'down')]
    case 'stop': return [figure(row.exactStopWeightGrams, unit, 'down')]
    case 'retest': return [row.dueMonth]
    case 'place': return [row.place?.name ?? null]
    case 'last': return [row.lastEventKind && KIND_WORDS[row.lastEventKind].done, row.lastEventAt]
    case 'serial': return [row.serial]
    case 'spec': return [row.spec]
    case 'condition': return [CONDITION_WORDS[row.condition]]
    case 'lifecycle': return [LIFECYCLE_WORDS[row.lifecycle]]
    case 'tare': return [figure(row.tareWeightGrams, unit, 'nearest')]
    case 'holder': return [row.holder?.name ?? null]
    case 'owner': return [row.owner?.name ?? null]
  }
}

// A number and not a text: a minus must not be taken for the beginning of a sum.
function figure(grams: number | null, unit: CsvUnit, rounding: MassRounding): number | null {
  return grams === null ? null : Number(formatFigure(grams, unit, rounding).figure.replace('\u2212', '-'))
}

function csvUnit(unit: MassUnit): CsvUnit {
  return unit === 'lb-oz' ? 'lb' : unit
}
