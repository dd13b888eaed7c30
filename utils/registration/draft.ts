import type { MassReading } from '../quantity/mass'
import { readMonthMark } from '../quantity/monthMark'
import type { Month } from '../quantity/month'
import type { Condition, Ownership } from '../custody/cylinderView'
import type { Stamp } from '../capacity/types'
import { EMPTY_MARK, isMarkTyped, readMarkEntry, type MarkEntry } from '../requalification/markEntry'
import type { RetestMark } from '../requalification/retestMark'
import { splitSpec } from '../requalification/specs'

/** What a person has typed of a collar stamp and of the cylinder that carries it. */
export interface RegistrationDraft {
  serial: string
  serialUnreadable: boolean
  maker: string
  /** As stamped, 'DOT-4BA400'. */
  spec: string
  tareWeight: MassReading | null
  /** null = not said; a TW without the valve gives no stop weight, and mending another field must not hide that. */
  tareIncludesValve: boolean | null
  waterCapacity: MassReading | null
  made: string
  marks: MarkEntry[]
  flammableMarked: boolean | null
  floatSwitch: boolean | null
  valve: string
  ownership: Ownership
  ownerId: string
  dedicatedTo: string
  /** No default: what is in it is asked. */
  contents: 'evacuated' | 'unknown' | 'refrigerant' | null
  refrigerant: string
  condition: Condition
  gross: MassReading | null
  placeId: string
}

/** What `registered` says of a cylinder. */
export interface RegistrationDetails {
  stamp: Stamp
  marks?: { month: Month, rin?: string, suffix?: string }[]
  ownership: Ownership
  ownerId?: string
  dedicatedTo?: string
  contents?: 'evacuated' | 'unknown' | { refrigerant: string, condition: Condition }
  gross?: MassReading
}

/** Words beside a field, by its name. */
export type FieldErrors = Partial<Record<string, string>>

/** A form with nothing typed yet. */
export function emptyDraft(): RegistrationDraft {
  return {
    serial: '', serialUnreadable: false, maker: '', spec: '', tareWeight: null, tareIncludesValve: null,
    waterCapacity: null, made: '', marks: [{ ...EMPTY_MARK }], flammableMarked: null, floatSwitch: null, valve: '',
    ownership: 'own', ownerId: '', dedicatedTo: '', contents: null, refrigerant: '', condition: 'clean', gross: null, placeId: '',
  }
}

/**
 * What a draft says, or what has to be mended before it can be recorded.
 *
 * Errors: only what is missing or cannot be read. What is merely unlikely is for {@link registrationDoubts}.
 */
export function readDraft(draft: RegistrationDraft, thisMonth: Month): { details: RegistrationDetails } | { errors: FieldErrors } {
  const errors: FieldErrors = {}
  const spec = splitSpec(draft.spec)
  const made = draft.made.trim() === '' ? null : readMonthMark(draft.made, thisMonth)
  const typedMarks = draft.marks.filter(isMarkTyped)
  const marks = typedMarks.map(mark => readMarkEntry(mark, thisMonth))

  if (draft.serial.trim() === '' && !draft.serialUnreadable) errors.serial = 'Copy the serial, or say that it cannot be read.'
  if (draft.spec.trim() === '') errors.spec = 'Copy the specification, such as DOT-4BA400.'
  else if (!spec) errors.spec = 'No specification of the list begins like this. Copy it with its DOT, such as DOT-4BA400.'
  if (draft.made.trim() !== '' && !made) errors.made = 'Write month and year, such as 03-21.'
  const wrongMark = marks.find(mark => 'error' in mark)
  if (wrongMark) errors.marks = wrongMark.error
  if (draft.contents === null) errors.contents = 'Say what is in it. If nobody knows, choose “unknown”.'
  if (draft.contents === 'refrigerant' && draft.refrigerant === '') errors.refrigerant = 'Choose the refrigerant.'
  if (draft.ownership !== 'own' && draft.ownerId === '') errors.ownerId = 'Choose whose it is.'
  if (draft.placeId === '') errors.placeId = 'Choose where it stands.'
  if (Object.keys(errors).length > 0 || !spec) return { errors }

  return {
    details: {
      stamp: stampOf(draft, spec, made),
      ...(marks.length ? { marks: marks.flatMap(read => 'mark' in read ? [markOf(read.mark)] : []) } : {}),
      ownership: draft.ownership,
      ...(draft.ownership === 'own' ? {} : { ownerId: draft.ownerId }),
      ...(draft.dedicatedTo ? { dedicatedTo: draft.dedicatedTo } : {}),
      contents: draft.contents === 'refrigerant' ? { refrigerant: draft.refrigerant, condition: draft.condition } : draft.contents!,
      ...(draft.gross ? { gross: draft.gross } : {}),
    },
  }
}

function stampOf(draft: RegistrationDraft, spec: { spec: string, servicePressurePsig: number | null }, made: Month | null): Stamp {
  return {
    serial: draft.serialUnreadable ? null : draft.serial.trim(),
    ...(draft.serialUnreadable ? { serialUnreadable: true } : {}),
    ...(draft.maker.trim() ? { maker: draft.maker.trim() } : {}),
    spec: spec.spec,
    servicePressurePsig: spec.servicePressurePsig,
    tareWeight: draft.tareWeight,
    ...(draft.tareIncludesValve === null ? {} : { tareIncludesValve: draft.tareIncludesValve }),
    waterCapacity: draft.waterCapacity,
    madeMonth: made,
    // Not seen counts as not marked: it only ever refuses, never permits.
    flammableMarked: draft.flammableMarked === true,
    ...(draft.floatSwitch === null ? {} : { floatSwitch: draft.floatSwitch }),
    ...(draft.valve.trim() ? { valve: draft.valve.trim() } : {}),
  }
}

function markOf({ month, rin, suffix }: RetestMark) {
  return { month, ...(rin === null ? {} : { rin }), ...(suffix === null ? {} : { suffix }) }
}
