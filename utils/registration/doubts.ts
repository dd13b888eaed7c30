import { exactGrams, formatMass, type MassUnit } from '../quantity/mass'
import { readMonthMark } from '../quantity/monthMark'
import { compareMonths, formatMonth, type Month } from '../quantity/month'
import { scaleAccuracyGrams } from '../quantity/scale'
import { readMarkEntry } from '../requalification/markEntry'
import type { RetestMark } from '../requalification/retestMark'
import { suffixDoubt } from '../requalification/suffixDoubt'
import { splitSpec } from '../requalification/specs'
import type { RegistrationDraft } from './draft'

/** One thing that was looked at once more: it fits, it is unlikely, or it was not said. */
export interface Doubt {
  code: string
  kind: 'ok' | 'att' | 'unk'
  text: string
}

// Steel refrigerant cylinders hold between 1.2 and 2.5 times their own weight of water (common practice, no source).
const USUAL_RATIO = { least: 1.2, most: 2.5 }
// From half a pound of water to a half-ton drum (common practice, no source).
const USUAL_WATER_GRAMS = { least: 1_000, most: 1_000_000 }
const OLDEST_YEARS = 60

/**
 * What a second look at a stamp says: which figures fit each other and which are unlikely enough to be asked about.
 *
 * Nothing here keeps a cylinder from being registered; `serialTaken` says whether the fleet knows the serial already.
 */
export function registrationDoubts(draft: RegistrationDraft, thisMonth: Month, unit: MassUnit, serialTaken: boolean | null): Doubt[] {
  return [
    ...serialDoubts(draft, serialTaken),
    ...ratioDoubts(draft),
    ...grossDoubts(draft, unit),
    ...monthDoubts(draft, thisMonth),
    ...suffixDoubts(draft, thisMonth),
    ...saidDoubts(draft),
  ]
}

/** Whether something is unlikely enough that the person is asked once more before it is recorded. */
export function asksAgain(doubts: readonly Doubt[]): boolean {
  return doubts.some(doubt => doubt.kind === 'att')
}

function serialDoubts(draft: RegistrationDraft, serialTaken: boolean | null): Doubt[] {
  const serial = draft.serial.trim()
  if (draft.serialUnreadable) return [{ code: 'serial-unreadable', kind: 'unk', text: 'Serial not readable: the label alone will name it.' }]
  if (serial === '' || serialTaken === null) return []
  return serialTaken
    ? [{ code: 'serial-taken', kind: 'att', text: `Serial ${serial} is in the fleet already. Is this another cylinder with the same serial?` }]
    : [{ code: 'serial-new', kind: 'ok', text: `Serial ${serial} is new in the fleet.` }]
}

function ratioDoubts(draft: RegistrationDraft): Doubt[] {
  if (!draft.tareWeight) return [{ code: 'tare-unknown', kind: 'unk', text: 'TW not said: no stop weight can be given.' }]
  if (!draft.waterCapacity) return [{ code: 'capacity-unknown', kind: 'unk', text: 'WC not said: no fill limit can be given.' }]
  const water = exactGrams(draft.waterCapacity)
  const tare = exactGrams(draft.tareWeight)
  const ratio = (water / tare).toFixed(2)
  const ratioIsUsual = water / tare >= USUAL_RATIO.least && water / tare <= USUAL_RATIO.most
  const sizeIsUsual = water >= USUAL_WATER_GRAMS.least && water <= USUAL_WATER_GRAMS.most
  if (tare === 0 || water === 0) return [{ code: 'weight-zero', kind: 'att', text: 'TW or WC is 0. Leave empty what cannot be read.' }]
  return ratioIsUsual && sizeIsUsual
    ? [{ code: 'ratio', kind: 'ok', text: `WC over TW is ${ratio}, usual for a refrigerant cylinder.` }]
    : [{ code: 'ratio', kind: 'att', text: `WC over TW is ${ratio}, which is unusual. Are both figures, and their unit, as stamped?` }]
}

function grossDoubts(draft: RegistrationDraft, unit: MassUnit): Doubt[] {
  if (!draft.gross || !draft.tareWeight) return []
  const gross = exactGrams(draft.gross)
  const tare = exactGrams(draft.tareWeight)
  const accuracy = scaleAccuracyGrams(gross)
  if (gross < tare - accuracy) {
    return [{ code: 'gross-below-tare', kind: 'att', text: `The scale shows ${formatMass(tare - gross, unit, 'up')} less than TW. Weigh it again, or look at TW.` }]
  }
  if (draft.contents === 'evacuated' && gross > tare + accuracy) {
    return [{ code: 'evacuated-but-heavy', kind: 'att', text: `It weighs ${formatMass(gross - tare, unit, 'nearest')} more than empty, but is said to be evacuated.` }]
  }
  if (draft.waterCapacity && gross - tare > exactGrams(draft.waterCapacity) * 1.5) {
    return [{ code: 'gross-too-heavy', kind: 'att', text: 'The scale shows more than it could hold. Is the unit right?' }]
  }
  return []
}

function monthDoubts(draft: RegistrationDraft, thisMonth: Month): Doubt[] {
  const made = readMonthMark(draft.made, thisMonth)
  const marks = readMarks(draft, thisMonth).map(({ month }) => month)
  const future = [made, ...marks].filter(month => month !== null && compareMonths(month, thisMonth) > 0) as Month[]
  const doubts: Doubt[] = future.map(month => ({ code: 'month-ahead', kind: 'att', text: `${formatMonth(month)} has not come yet.` }))
  if (made && compareMonths(thisMonth, made) > OLDEST_YEARS * 12) {
    doubts.push({ code: 'very-old', kind: 'att', text: `Made in ${formatMonth(made)}, more than ${OLDEST_YEARS} years ago?` })
  }
  if (made && marks.some(mark => compareMonths(mark, made) < 0)) {
    doubts.push({ code: 'test-before-made', kind: 'att', text: 'A test mark is older than the cylinder.' })
  }
  else if (made && marks.length && future.length === 0) {
    doubts.push({ code: 'months', kind: 'ok', text: 'The test marks are later than the month it was made.' })
  }
  if (!made && marks.length === 0) doubts.push({ code: 'no-month', kind: 'unk', text: 'No month known: it may not be filled before a test.' })
  return doubts
}

function readMarks(draft: RegistrationDraft, thisMonth: Month): RetestMark[] {
  return draft.marks.map(mark => readMarkEntry(mark, thisMonth)).flatMap(read => 'mark' in read ? [read.mark] : [])
}

function suffixDoubts(draft: RegistrationDraft, thisMonth: Month): Doubt[] {
  return readMarks(draft, thisMonth)
    .filter(({ suffix }) => suffix !== null && suffixDoubt(suffix) !== null)
    .map(({ suffix }) => ({ code: 'suffix', kind: 'att', text: `${suffix} is no suffix of a retest mark.` }))
}

function saidDoubts(draft: RegistrationDraft): Doubt[] {
  const doubts: Doubt[] = []
  const spec = splitSpec(draft.spec)
  if (spec?.spec === 'DOT-39') doubts.push({ code: 'not-refillable', kind: 'att', text: 'A DOT-39 is never refilled. Register it only to keep account of it.' })
  if (spec && spec.servicePressurePsig === null) doubts.push({ code: 'no-pressure', kind: 'unk', text: 'No service pressure in the specification: no plan to fill.' })
  if (draft.flammableMarked !== true) doubts.push({ code: 'not-flammable', kind: 'unk', text: 'No mark for flammables: A2L, A2, A3 and B2L to B3 will be refused.' })
  if (draft.floatSwitch === null) doubts.push({ code: 'float', kind: 'unk', text: 'Float switch not said. Leave it, or look at the valve.' })
  return doubts
}
