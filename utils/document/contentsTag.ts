import type { CylinderView, LogLine } from '../custody/cylinderView'
import type { EventKind } from '../custody/kinds'
import { volumeLitres } from '../capacity/rules/ruleInput'
import { formatLabelCode } from '../label/code'
import { formatMass } from '../quantity/mass'
import type { MassReading } from '../quantity/mass'
import { formatDay, wallClock } from '../quantity/instant'

/** How a refrigerant is named for transport, as the tag and its page say it; null numbers are left to the shipper. */
export interface TagEntry {
  un: string | null
  properShippingName: string | null
  /** What the shipper has to judge, or why there is no entry; null where nothing is open. */
  judgement: string | null
  source: string | null
}

/** Everything that the tag of one fill says. */
export interface ContentsTag {
  code: string
  refrigerant: string
  /** 'Recovered', with its condition where that is not clean; empty where it did not come here by a recovery. */
  kind: string
  /** In pounds and kilograms; null where it was not weighed. */
  net: string | null
  /** The day of the fill, ISO 8601. */
  on: string
  technician: string
  entry: TagEntry
  /** Least height of the identification number, in millimetres. */
  numberHeightMm: 6 | 12
}

const MOST_LITRES_OF_SMALL = 60
const MOST_NET_GRAMS_OF_SMALL = 30_000

/**
 * The height that an identification number has to have on a package.
 *
 * Units: millimetres. What is not known counts as large.
 * Source: 49 CFR 172.301(a)(1): 12 mm; 6 mm on a cylinder of at most 60 L of water capacity, or up to 30 kg net.
 */
export function numberHeightMm(waterCapacity: MassReading | null, netGrams: number | null): 6 | 12 {
  const isSmall = (waterCapacity !== null && volumeLitres(waterCapacity) <= MOST_LITRES_OF_SMALL) || (netGrams !== null && netGrams <= MOST_NET_GRAMS_OF_SMALL)
  return isSmall ? 6 : 12
}

/**
 * Why a cylinder gets no contents tag, in words; null where it may have one.
 *
 * @param isClassified whether its shipper has said how it travels: then the tag says that, whatever is mixed in it.
 */
export function noTagBecause({ contents, labelCode }: Pick<CylinderView, 'contents' | 'labelCode'>, isClassified = false): string | null {
  if (contents.nothingInIt) return 'Nothing is in it. Take the tag of its last contents off.'
  if (contents.refrigerant === null && !isClassified) {
    return contents.condition === 'mixed'
      ? 'Different refrigerants are mixed in it: a tag that names one would be wrong (49 CFR 172.303(a)). Write “mixed refrigerants” by hand, and have the reclaimer say how it travels.'
      : 'What is in it is not known: a tag may not name what nobody has found out (49 CFR 172.303(a)). Check it first.'
  }
  if (labelCode === null) return 'It has no label whose code the tag could repeat. Label it first.'
  return null
}

const BY_RECOVERY: ReadonlySet<string> = new Set(['filled', 'transferred'])
const PUTS_IN: ReadonlySet<string> = new Set(['filled', 'transferred', 'received', 'returned', 'exchanged', 'registered'])

/**
 * What the contents tag of a cylinder says.
 *
 * Shape: `log` is its custody log, newest first; the tag bears the day and the author of what last went in.
 * Errors: RangeError where `noTagBecause` has a reason.
 */
export function contentsTag(view: CylinderView, log: readonly LogLine[], entry: TagEntry, isClassified = false): ContentsTag {
  const stands = log.filter(line => line.correction?.takenOut !== true)
  const putIn = stands.find(line => PUTS_IN.has(line.kind) && line.netAfterGrams !== null && line.netAfterGrams > (line.netBeforeGrams ?? 0))
    ?? stands.find(line => PUTS_IN.has(line.kind))
  if (putIn === undefined) throw new RangeError('This cylinder gets no contents tag')
  return tagOfFill(view, { kind: putIn.kind, on: putIn.effectiveAt, technician: putIn.author.name }, entry, isClassified)
}

/**
 * What the contents tag says after what last went in: its kind, when (ISO 8601), and by whom.
 *
 * Errors: RangeError where `noTagBecause` has a reason.
 */
export function tagOfFill(view: CylinderView, putIn: { kind: EventKind, on: string, technician: string }, entry: TagEntry, isClassified = false): ContentsTag {
  const { contents, labelCode, stamp } = view
  if (noTagBecause(view, isClassified) !== null || labelCode === null) throw new RangeError('This cylinder gets no contents tag')
  const condition = contents.burnt ? 'burnt' : contents.condition
  return {
    code: labelCode,
    refrigerant: contents.refrigerant ?? (contents.condition === 'mixed' ? 'Mixed' : 'Unnamed'),
    kind: [BY_RECOVERY.has(putIn.kind) ? 'Recovered' : '', ['clean', 'unknown', ...contents.refrigerant === null ? ['mixed'] : []].includes(condition) ? '' : condition].filter(Boolean).join(', '),
    net: contents.netGrams === null ? null : `${formatMass(contents.netGrams, 'lb', 'nearest')} (${formatMass(contents.netGrams, 'kg', 'nearest')})`,
    on: putIn.on,
    technician: putIn.technician,
    entry,
    numberHeightMm: numberHeightMm(stamp?.waterCapacity ?? null, contents.netGrams),
  }
}

/** The day of a fill as the tag bears it. @example tagDay(ms, 'America/Phoenix') // '1 Dec 2026' */
export function tagDay(ms: number, timeZone: string): string {
  return `${formatDay(ms, timeZone)} ${wallClock(ms, timeZone).year}`
}

/** GET /api/cylinders/{ref}/contents-tag: what its tag says, or in words why it gets none. */
export type ContentsTagAnswer
  = { refusal: string, tag: null }
    /** `payload`: what the symbol leads to; `day`: the day of the fill in the firm's time zone, as it is written. */
    | { refusal: null, tag: ContentsTag, payload: string, day: string }

/**
 * The tag as lines to copy by hand, in their order, where there is no printer.
 *
 * @example ['R-410A', 'Recovered', 'UN3163', 'Liquefied gas, n.o.s. (…)', 'Net 13.95 lb (6.33 kg)', '1 Dec 2026, Tina Field', '7K3 M9Q 2TX']
 */
export function tagLines(tag: ContentsTag, day: string): string[] {
  return [
    tag.refrigerant, tag.kind, tag.entry.un ?? '', tag.entry.properShippingName ?? '',
    tag.net === null ? 'Net not weighed' : `Net ${tag.net}`, `${day}, ${tag.technician}`, formatLabelCode(tag.code),
  ].filter(line => line !== '')
}
