import type { LevelVerdict } from '../recovery/types'
import type { StatusKind } from './status'

/** The status by which the screen says whether a level of evacuation was reached. */
export const LEVEL_STATUS: Record<LevelVerdict['verdict'], StatusKind> = { 'reached': 'ok', 'not-reached': 'stop', 'unknown': 'unk' }
