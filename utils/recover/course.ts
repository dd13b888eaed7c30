import type { FilledDraft, OnTheWay } from '../custody/draft/filled'
import type { Job } from '../contract/jobs'
import { ownerOfJob } from '../jobs/jobDraft'
import type { MassReading } from '../quantity/mass'
import { levelDraft, type LevelDraft } from '../recovery/levelDraft'
import type { ReadReached } from '../recovery/reachedDraft'
import { micronsFromMmHg } from '../quantity/vacuum'
import type { RecoveryPlan } from './plan'
import type { WayReading } from './readings'
import { fillStage, isStop } from './stage'

/** The steps of a recovery beside the scale, in their order. */
export const RECOVERY_STEPS = ['before', 'filling', 'hoses', 'weigh'] as const

export type RecoveryStep = typeof RECOVERY_STEPS[number]

/** The steps in words. */
export const STEP_WORDS: Record<RecoveryStep, string> = { before: 'before', filling: 'filling', hoses: 'hoses off', weigh: 'weigh it' }

/** A recovery on its way: what its event will say, and where its person stands in it. */
export interface RecoveryCourse extends FilledDraft {
  step: RecoveryStep
  /** The cylinder, so that a recovery can be gone on with where it cannot be looked up. */
  cylinder: { id: string, labelCode: string | null, name: string }
  /** Null until filling begins. */
  plan: RecoveryPlan | null
  /** The stop that the last reading reached was seen. */
  stopSeen: boolean
  machineOff: boolean
  valvesShut: boolean
  hosesOff: boolean
  level: LevelDraft
}

/** A recovery that has not begun. */
export function newCourse(draft: FilledDraft, cylinder: RecoveryCourse['cylinder']): RecoveryCourse {
  return { ...draft, step: 'before', cylinder, plan: null, stopSeen: false, machineOff: false, valvesShut: false, hosesOff: false, level: levelDraft({}) }
}

/**
 * A recovery that is of a job: whose it is comes from there, and what was said of the equipment where nothing else was said
 * here. null: of none; what was taken over stays.
 */
export function courseOfJob(course: RecoveryCourse, job: Pick<Job, 'id' | 'keeps' | 'customer' | 'charge' | 'opened'> | null): RecoveryCourse {
  if (job === null) return { ...course, jobId: '' }
  const { charge, machineMade, circumstances, appliance } = course.level
  return {
    ...course,
    jobId: job.id,
    ownerId: ownerOfJob(job),
    level: {
      ...course.level,
      charge: charge ?? job.charge,
      machineMade: machineMade || (job.opened?.machineMade ?? ''),
      circumstances: circumstances || (job.opened?.circumstances ?? ''),
      appliance: appliance === 'other' ? job.opened?.appliance ?? 'other' : appliance,
    },
  }
}

/** The readings noted so far, the oldest first. */
export function readingsOf({ onTheWay }: Pick<RecoveryCourse, 'onTheWay'>): WayReading[] {
  return onTheWay.readings ?? []
}

/** What the scale showed last: the last reading, else the weight before. */
export function lastGrossOf(course: Pick<RecoveryCourse, 'onTheWay' | 'grossBefore'>): MassReading | null {
  return readingsOf(course).at(-1)?.gross ?? course.grossBefore
}

/** What keeps filling from beginning, in a sentence; null where it may begin. */
export function notReadyBecause(course: Pick<RecoveryCourse, 'grossBefore'>, plan: RecoveryPlan | null): string | null {
  if (!plan) return 'Nothing may go into it as it stands.'
  if (!course.grossBefore) return 'Weigh it before the hoses go on: take the last weight, or type what the scale shows.'
  return isStop(fillStage(plan, course.grossBefore)) ? 'By the weight before it is full already: nothing may go in.' : null
}

/** What the system came down to, as it is recorded; undefined where nothing was read on a gauge. */
export function reachedOf({ reached, heldMinutes }: ReadReached): OnTheWay['reached'] {
  if (reached === null || 'recoveredGrams' in reached) return undefined
  const vacuum = 'mmHgAbsolute' in reached ? { microns: micronsFromMmHg(reached.mmHgAbsolute) } : reached
  return { vacuum, ...(heldMinutes !== null && { heldMinutes }) }
}
