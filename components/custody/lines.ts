import type { DetailsOf } from '~~/utils/custody/schema'
import { damageInWords } from '~~/utils/custody/damage'
import type { LogLine } from '~~/utils/custody/cylinderView'
import type { EventKind } from '~~/utils/custody/kinds'
import { CONDITION_WORDS, KIND_WORDS } from '~~/utils/custody/words'
import { cylinderPath } from '~~/utils/fleet/cylinderPath'
import { formatLabelCode } from '~~/utils/label/code'
import { formatBarometer, formatGauge, formatThermometer } from '~~/utils/quantity/gauge'
import { formatReading, type MassReading } from '~~/utils/quantity/mass'
import { formatMonth } from '~~/utils/quantity/month'
import { methodWords } from '~~/utils/recovery/methods'

/** What a line of the custody log says of one event. */
export interface LineWords {
  what: string
  /** Where to, whom to, or which firm; null where nothing moved. */
  to: string | null
  gross: MassReading | null
  /** The other cylinder of what happened between two, and its page; null where there is none. */
  other: { text: string, to: string | null } | null
}

type Names = Record<string, string>
type Say<K extends EventKind> = (details: DetailsOf<K>, names: Names) => Partial<LineWords>

const LOSSES = { leak: 'by a leak', relief: 'through the relief device', hose: 'at a hose', accident: 'by an accident', unknown: 'cause not known' }
const PURPOSES = { 'same-system': 'back into the same system', 'same-owner': 'for the same owner', 'sampling': 'a sample', 'other': 'for something else' }

/** How each kind of event reads. */
const LINES: { [K in EventKind]: Say<K> } = {
  'registered': ({ stamp, contents, gross }) => ({
    what: `stamp read from the collar${contents === undefined ? '' : `, ${contentsInWords(contents)}`}${stamp.serial ? `, SN ${stamp.serial}` : ''}`,
    gross: gross ?? null,
  }),
  'labelled': ({ code, replaces, reason }) => ({
    what: `${formatLabelCode(code)}${replaces ? ` in place of ${formatLabelCode(replaces)}` : ''}${reason ? `: ${reason}` : ''}`,
  }),
  'received': ({ fromFirmId, gross, paper }, names) => ({
    what: [fromFirmId && `from ${named(fromFirmId, names)}`, paper && `paper ${paper}`].filter(Boolean).join(', ') || 'came in',
    gross: gross ?? null,
  }),
  'moved': ({ toPlaceId, toHolderId }, names) => ({
    what: `to ${named(toPlaceId, names)}${toHolderId ? `, holder ${named(toHolderId, names)}` : ''}`,
    to: named(toPlaceId, names),
  }),
  'handed-over': ({ toHolderId }, names) => ({ what: `to ${named(toHolderId, names)}` }),
  'weighed': ({ gross }) => ({ what: 'the change is weighing', gross }),
  'filled': ({ refrigerant, condition, grossBefore, grossAfter, method, ownerOfRefrigerantId, jobId, ownerConsents, purged, readings, reached }, names) => ({
    what: [
      `${refrigerant ?? 'refrigerant not known,'} recovered`,
      condition && CONDITION_WORDS[condition],
      ownerOfRefrigerantId && `of ${named(ownerOfRefrigerantId, names)}`,
      grossBefore && `from ${formatReading(grossBefore)}`,
      method && `by ${methodWords(method)}`,
      jobId && 'for a job',
      ownerConsents && 'its owner agrees to the fill',
      purged && 'hoses purged',
      readings?.length && `${readings.length} ${readings.length === 1 ? 'reading' : 'readings'} on the way`,
      reached && `system down to ${vacuumWords(reached.vacuum)}${reached.heldMinutes === undefined ? '' : `, held ${reached.heldMinutes} min`}`,
    ].filter(Boolean).join(', '),
    gross: grossAfter,
  }),
  'drawn': ({ grossAfter, purpose, phase }) => ({
    what: `${PURPOSES[purpose]}${phase ? `, ${phase === 'vapour' ? 'vapor' : phase}` : ''}`,
    gross: grossAfter,
  }),
  'transferred': ({ direction, refrigerant, condition, grossBefore, grossAfter, ownerOfRefrigerantId }, names) => ({
    what: [
      `${refrigerant ?? 'refrigerant not known,'} went ${direction}`,
      condition !== 'clean' && CONDITION_WORDS[condition],
      ownerOfRefrigerantId && `of ${named(ownerOfRefrigerantId, names)}`,
      grossBefore && `from ${formatReading(grossBefore)}`,
    ].filter(Boolean).join(', '),
    gross: grossAfter,
  }),
  'checked': details => ({ what: checkInWords(details) }),
  'emptied': ({ grossAfter, vacuum }) => ({ what: vacuum ? vacuumInWords(vacuum) : 'a heel is left', gross: grossAfter ?? null }),
  'lost': ({ grossAfter, cause, unavoidable }) => ({
    what: `${LOSSES[cause]}${unavoidable ? ', could not be avoided' : ''}`,
    gross: grossAfter ?? null,
  }),
  'inspected': details => ({
    what: details.result === 'sound' ? 'no damage seen outside' : ['damaged', damageInWords(details.reasons ?? [])].filter(Boolean).join(': '),
  }),
  'quarantined': ({ reason }) => ({ what: reason }),
  'released': ({ reason }) => ({ what: reason }),
  'missing': ({ lastSeen }) => ({ what: lastSeen === undefined ? 'nobody finds it' : `last seen: ${lastSeen}` }),
  'found': ({ placeId }, names) => placeId === undefined ? { what: 'where the log had it' } : { what: `at ${named(placeId, names)}`, to: named(placeId, names) },
  'retired': ({ reason, proof }) => ({
    what: [reason, proof?.text, proof?.certificate && `certificate ${proof.certificate}`, proof?.photoIds && photosInWords(proof.photoIds.length)].filter(Boolean).join('; '),
  }),
  'sent-for-reclaim': ({ shipmentId, gross }, names) => ({ what: `left with ${names[shipmentId] ?? 'a shipment'}`, gross }),
  'reclaimed': ({ theirGross, acceptedNet, grade, reported }) => ({
    what: [
      'taken over by the reclaimer', acceptedNet && `accepted ${formatReading(acceptedNet)} net`, grade && `grade ${grade}`,
      reported?.name && `reported at the dock by ${reported.name}`,
    ].filter(Boolean).join(', '),
    gross: theirGross ?? null,
  }),
  'returned': ({ fromFirmId, gross }, names) => ({ what: `from ${named(fromFirmId, names)}`, gross: gross ?? null }),
  'exchanged': ({ direction, firmId }, names) => ({
    what: direction === 'out' ? `went to ${named(firmId, names)}` : `came from ${named(firmId, names)}`,
    to: direction === 'out' ? named(firmId, names) : null,
  }),
  'sent-for-test': ({ lotId }, names) => ({ what: `left with ${names[lotId] ?? 'a test lot'}` }),
  'retested': ({ month, method, result, requalifierId, suffix, newTare }, names) => ({
    what: `${result}, ${method}, ${formatMonth(month)}${suffix ? `, marked ${suffix}` : ''}, by ${named(requalifierId, names)}${newTare ? `, new tare ${formatReading(newTare)}` : ''}`,
  }),
  'countersigned': () => ({ what: 'signs a trainee’s entry' }),
  'corrected': ({ reason, instead }) => ({ what: `${instead ? 'other details' : 'taken out'}: ${reason}` }),
}

/** What a line says; an event of a kind that this screen does not know yet still shows its name. */
export function lineWords(line: LogLine): LineWords {
  const say = LINES[line.kind] as Say<EventKind> | undefined
  const words = say?.(line.details as DetailsOf<EventKind>, line.names) ?? { what: line.kind }
  return { what: words.what ?? '', to: words.to ?? line.place?.name ?? null, gross: words.gross ?? null, other: otherCylinder(line) }
}

function otherCylinder({ kind, details, otherCylinder: cylinder }: LogLine): LineWords['other'] {
  if (kind !== 'transferred' && kind !== 'exchanged') return null
  const { direction } = details as DetailsOf<typeof kind>
  const before = kind === 'transferred' ? (direction === 'out' ? 'into ' : 'out of ') : 'in exchange for '
  if (!cylinder) return { text: `${before}a cylinder that is not in the log`, to: null }
  const { labelCode, serial } = cylinder
  return { text: `${before}${labelCode ? formatLabelCode(labelCode) : serial === null ? 'a cylinder without a label' : `SN ${serial}`}`, to: cylinderPath(cylinder) }
}

/** The word of a line's kind. */
export function lineVerb(line: LogLine): string {
  return KIND_WORDS[line.kind]?.done ?? line.kind
}

function photosInWords(count: number): string {
  return count === 1 ? 'a photo' : `${count} photos`
}

function named(id: string, names: Names): string {
  return names[id] ?? 'not known'
}

function contentsInWords(contents: NonNullable<DetailsOf<'registered'>['contents']>): string {
  if (contents === 'evacuated') return 'evacuated'
  if (contents === 'unknown') return 'contents not known'
  return `${contents.refrigerant}, ${CONDITION_WORDS[contents.condition]}`
}

function vacuumInWords(vacuum: NonNullable<DetailsOf<'emptied'>['vacuum']>): string {
  return `down to ${vacuumWords(vacuum)}`
}

function vacuumWords(vacuum: { microns: number } | { inHg: number }): string {
  return 'microns' in vacuum ? `${vacuum.microns} microns` : `${vacuum.inHg} inHg`
}

function checkInWords(details: DetailsOf<'checked'>): string {
  if (details.method === 'pressure') {
    const { pressureKPa, temperatureC, barometerKPa } = details
    const read = (unit: 'psi' | 'bar') => `${formatGauge(pressureKPa, unit)} at ${formatThermometer(temperatureC, unit)}`
    return `pressure ${read('psi')} (${read('bar')})${barometerKPa === undefined ? '' : `, barometer ${formatBarometer(barometerKPa)}`}`
  }
  const { method, composition = [], verdict } = details
  const parts = composition.map(({ component, massPercent }) => `${component} ${massPercent} %`).join(', ')
  const by = method === 'identifier' ? 'by identifier' : 'by laboratory'
  return `${by}: ${verdict.refrigerant ?? 'refrigerant not named'}, ${CONDITION_WORDS[verdict.condition]}${parts && `; ${parts}`}`
}
