import { dotMm } from './printer'
import { QUIET_MODULES } from './symbol'

/** Without a known diameter: 29 of these suit a cylinder from 8.2 in across, and are read up to an arm's length away. */
const USUAL_MODULE_MM = 1

/** Smaller ones are read from too near for many phones to focus. */
export const LEAST_MODULE_MM = 0.5

/** Side of the symbol over the diameter: an arc of 16 degrees, with which a tilted phone still reads every symbol. */
const GOOD_ARC_SHARE = 0.14

/** An arc of 20 degrees: beyond it a phone has to be held straight on. */
const MOST_ARC_SHARE = 0.175

/** What a symbol has to be fitted to. */
export interface SymbolPlace {
  /** Modules along its side, quiet zone excepted. */
  modules: number
  /** Side of the place for it, quiet zone and all. */
  sideMm: number
  dotsPerInch: number
  /** Of the cylinder that it is stuck on; null for the flat of a guard, or where it is not known. */
  diameterMm: number | null
}

/** The modules that a symbol is drawn with, or why none will do. */
export type ModuleSize
  = | { is: 'good' | 'at-the-limit', moduleMm: number, sideMm: number }
  /** The cylinder is too narrow: the flat of its guard is the place. */
    | { is: 'too-curved' }
  /** The address is too long for a label of this size. */
    | { is: 'no-room' }

/**
 * The largest modules of whole printer dots that the place and the curve of the cylinder allow.
 *
 * Shape: where the diameter is not known, at most 1 mm; where only the least module keeps within the outer limit of
 * the arc, that one.
 * Units: millimetres. Rounding: down to whole dots, so that no limit is passed.
 * Source: the shares are ours, from simulated poses up to 30 degrees of tilt.
 *
 * @example moduleSize({ modules: 29, sideMm: 37.6, dotsPerInch: 203.2, diameterMm: 152.4 }) // 0.625 mm: 18.1 mm of 21.3
 */
export function moduleSize({ modules, sideMm, dotsPerInch, diameterMm }: SymbolPlace): ModuleSize {
  const dot = dotMm({ dotsPerInch })
  const least = Math.ceil(wholeDots(LEAST_MODULE_MM / dot))
  const room = Math.floor(wholeDots(sideMm / (modules + 2 * QUIET_MODULES) / dot))
  if (room < least) return { is: 'no-room' }
  const size = (is: 'good' | 'at-the-limit', dots: number): ModuleSize => ({ is, moduleMm: dots * dot, sideMm: dots * dot * modules })

  if (diameterMm === null) return size('good', Math.min(room, Math.round(USUAL_MODULE_MM / dot)))
  const byArc = Math.floor(wholeDots(GOOD_ARC_SHARE * diameterMm / modules / dot))
  if (byArc >= least) return size('good', Math.min(room, byArc))
  return least * dot * modules <= MOST_ARC_SHARE * diameterMm ? size('at-the-limit', least) : { is: 'too-curved' }
}

/** A quotient that is whole but for the noise of binary fractions counts as whole. */
function wholeDots(dots: number): number {
  return Math.abs(dots - Math.round(dots)) < 1e-9 ? Math.round(dots) : dots
}
