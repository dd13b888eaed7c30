import type { PressureClass } from '../refrigerant/pressureClass'
import { mostLeftMmHg, TABLE_CELLS, type TableCell } from './evacuationTable'
import type { ChargeBand, MachineMade } from './types'

/** What the table is asked with; null where it is not known. */
export interface TableQuestion {
  /** One class, or two that a refrigerant lies between; the likelier one first. */
  pressureClasses: readonly PressureClass[] | null
  charge: ChargeBand | null
  machineMade: MachineMade | null
}

/** The cell that answers, and which of what was not sure made a difference to it. */
export interface TableAnswer { cell: TableCell, matters: { pressureClass: boolean, charge: boolean, machineMade: boolean } }

/**
 * The cell of the table that asks for most, of all that what is known leaves open.
 *
 * Source: 40 CFR 82.156 Table 1.
 */
export function tableLevel({ pressureClasses, charge, machineMade }: TableQuestion): TableAnswer {
  const classes = pressureClasses ?? TABLE_CELLS.map(cell => cell.pressureClass)
  const open = TABLE_CELLS
    .filter(cell => classes.includes(cell.pressureClass) && (charge ?? cell.charge) === cell.charge && (machineMade ?? cell.machineMade) === cell.machineMade)
    .sort((a, b) => mostLeft(a) - mostLeft(b) || classes.indexOf(a.pressureClass) - classes.indexOf(b.pressureClass))
  const cell = open[0]
  if (!cell) throw new RangeError('The table has no cell for this')
  const differs = (...others: (keyof TableCell)[]) =>
    open.some(one => others.every(key => one[key] === cell[key]) && mostLeft(one) !== mostLeft(cell))
  return {
    cell,
    matters: {
      pressureClass: differs('charge', 'machineMade'),
      charge: differs('pressureClass', 'machineMade'),
      machineMade: differs('pressureClass', 'charge'),
    },
  }
}

function mostLeft(cell: TableCell): number {
  return mostLeftMmHg(cell.level) ?? Infinity
}
