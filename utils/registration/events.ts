import type { RegistrationDetails } from './draft'

/** An event as a screen sends it to be recorded. */
export interface SentEvent {
  id: string
  cylinderId: string
  kind: string
  occurredAt: string
  deviceId: string
  deviceSeq: number
  placeId?: string
  confirmed?: string[]
  details: unknown
}

/** What is made once for a registration, so that sending it again records nothing twice. */
export interface RegistrationStamp {
  cylinderId: string
  registeredId: string
  labelledId: string
  deviceId: string
  /** Of the first event; the second counts one up. */
  deviceSeq: number
  /** ISO 8601 with offset. */
  occurredAt: string
}

/** The events of one registration, the label's last; without a code the cylinder is registered without a label. */
export function registrationEvents(details: RegistrationDetails, placeId: string, code: string | null, made: RegistrationStamp): SentEvent[] {
  const common = { cylinderId: made.cylinderId, occurredAt: made.occurredAt, deviceId: made.deviceId, placeId }
  const registered: SentEvent = { ...common, id: made.registeredId, kind: 'registered', deviceSeq: made.deviceSeq, details }
  if (code === null) return [registered]
  return [registered, { ...common, id: made.labelledId, kind: 'labelled', deviceSeq: made.deviceSeq + 1, details: { code } }]
}
