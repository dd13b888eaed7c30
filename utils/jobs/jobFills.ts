import type { Doer, JobDraw, JobFill, NamedCylinder } from '../contract/jobs'
import { applyCorrections, type Standing } from '../custody/corrections'
import type { AnyRecordedEvent, RecordedEvent } from '../custody/event'
import { signaturesOf, needsSignature } from '../custody/signatures'
import { readingGrams, type MassReading } from '../quantity/mass'
import { scaleAccuracyGrams, type Scale } from '../quantity/scale'
import { judgeLevel } from '../recovery/judgeLevel'
import type { RequiredLevel } from '../recovery/types'

/** What the lines of a job are read from, beside the log. */
export interface JobContext {
  /** By event and cause, as the books have it; an event that is not there moved nothing that is known. */
  moved: ReadonlyMap<string, number>
  scales: ReadonlyMap<string, Scale>
  required: Pick<RequiredLevel, 'level' | 'alternative'>
  cylinder: (id: string) => NamedCylinder
  person: (id: string) => Doer
}

/** What was recovered and drawn for a job, as the log now stands, in order of effect. What a correction took out is not there. */
export function jobLines(jobId: string, logs: Iterable<readonly AnyRecordedEvent[]>, context: JobContext): { fills: JobFill[], draws: JobDraw[] } {
  const fills: (JobFill & Ordered)[] = []
  const draws: (JobDraw & Ordered)[] = []
  for (const events of logs) {
    const standings = applyCorrections(events)
    const signatures = signaturesOf(standings)
    for (const standing of standings) {
      const { event, isOut } = standing
      if (isOut || !namesJob(event, jobId)) continue
      const apart = event.practice ? 'practice' as const : needsSignature(event) && !signatures.has(event.id) ? 'unsigned' as const : null
      if (event.kind === 'filled') fills.push({ ...fillOf(event, standing, context), apart, order: event.effectiveAt })
      if (event.kind === 'drawn') draws.push({ ...drawOf(event, context), apart, order: event.effectiveAt })
    }
  }
  return { fills: inOrder(fills), draws: inOrder(draws) }
}

/** The sum of what is known of fills that count; null where none is known. */
export function recoveredGrams(fills: readonly Pick<JobFill, 'netGrams' | 'apart'>[]): number | null {
  const known = fills.flatMap(({ netGrams, apart }) => apart === null && netGrams !== null ? [netGrams] : [])
  return known.length === 0 ? null : known.reduce((sum, grams) => sum + grams, 0)
}

interface Ordered { order: number }

function inOrder<T extends Ordered>(lines: T[]): Omit<T, 'order'>[] {
  return lines.sort((a, b) => a.order - b.order).map(({ order: _, ...line }) => line)
}

/** Whether an event is of a job. */
export function namesJob(event: AnyRecordedEvent, jobId: string): boolean {
  return (event.kind === 'filled' || event.kind === 'drawn') && event.details.jobId === jobId
}

function fillOf(event: RecordedEvent<'filled'>, { correction }: Standing, context: JobContext): Omit<JobFill, 'apart'> {
  const { refrigerant, condition = null, grossBefore = null, grossAfter, method = null, reached, ownerOfRefrigerantId = null, scaleId } = event.details
  const scale = scaleId === undefined ? undefined : context.scales.get(scaleId)
  const accuracy = (reading: MassReading) => scaleAccuracyGrams(readingGrams(reading), scale)
  const netGrams = context.moved.get(event.id) ?? (grossBefore && readingGrams(grossBefore) === readingGrams(grossAfter) ? 0 : null)
  return {
    eventId: event.id,
    cylinder: context.cylinder(event.cylinderId),
    at: new Date(event.effectiveAt).toISOString(),
    refrigerant, condition, grossBefore, grossAfter, netGrams, method,
    uncertaintyGrams: netGrams === null || grossBefore === null ? null : accuracy(grossBefore) + accuracy(grossAfter),
    reached: reached ? judgeLevel(context.required, reached.vacuum, reached.heldMinutes ?? null) : null,
    by: context.person(event.actorId),
    supervisor: event.supervisorId === null ? null : context.person(event.supervisorId),
    ownerId: ownerOfRefrigerantId,
    corrected: correction !== null,
  }
}

function drawOf(event: RecordedEvent<'drawn'>, context: JobContext): Omit<JobDraw, 'apart'> {
  const moved = context.moved.get(event.id)
  return {
    eventId: event.id,
    cylinder: context.cylinder(event.cylinderId),
    at: new Date(event.effectiveAt).toISOString(),
    purpose: event.details.purpose,
    netGrams: moved === undefined ? null : -moved,
    by: context.person(event.actorId),
  }
}
