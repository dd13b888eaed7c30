import { z } from 'zod'
import type { Named } from '../custody/cylinderView'
import type { EventKind } from '../custody/kinds'
import type { MovementCause } from '../custody/movement'
import { isDay } from '../quantity/day'
import { BALANCE_LINES, OWN } from './balanceLines'
import { id, page, type Page } from './parts'

const day = z.string().regex(/^(19|20|21)\d{2}-\d{2}-\d{2}$/, 'must be a day such as 2026-03-31').refine(isDay, 'must be a day that the calendar has')

const asked = {
  from: day.optional(),
  to: day.optional(),
  refrigerant: z.string().trim().min(1).max(40).optional(),
  owner: z.union([z.literal(OWN), id], 'must be own or the id of a firm').optional(),
}

/**
 * GET /api/reports/mass-balance: both days count, in the firm's time zone.
 *
 * Left out: from the first of the present month, or of the month of `to`; to today, or to the end of the month of `from`
 * where that is over.
 */
export const massBalanceQuery = z.strictObject(asked)
export type MassBalanceQuery = z.output<typeof massBalanceQuery>

/** GET /api/reports/mass-balance/movements: what is behind one line, newest first. */
export const balanceMovementsQuery = z.strictObject({ ...asked, ...page, line: z.enum(BALANCE_LINES) })
export type BalanceMovementsQuery = z.output<typeof balanceMovementsQuery>

/** The days that a balance is about, and the instants at which they begin and end. */
export interface Period {
  from: string
  to: string
  fromAt: string
  /** The first instant after it. */
  untilAt: string
}

/** One refrigerant's account over a period. Units: grams, to the gram. */
export interface BalanceAccount {
  openingGrams: number
  /** Every cause of the closed list once, in the order of the account; without what is apart. */
  causes: { cause: MovementCause, grams: number, movements: number }[]
  /** Practice, and what a trainee recorded without a countersignature: inside the sum, outside regulatory totals. */
  apart: { grams: number, movements: number }
  /** The sum of all of the above. */
  closingGrams: number
  /** What weighing and new tares found and no cause explains. */
  unexplained: {
    grams: number
    /** How far the readings behind it may be off together. Rounding: up to the whole gram. */
    uncertaintyGrams: number
    /** More than that. */
    isMore: boolean
  }
  /** What the cylinders held by their own account, as the period began and as it ended. */
  stock: { opening: BalanceStock, closing: BalanceStock }
  /** Whether the books are what the cylinders held, at both instants, to the gram. */
  agrees: boolean
}

/** What the cylinders held at an instant. */
export interface BalanceStock {
  grams: number
  /** Of the weights it rests on. Rounding: up to the whole gram. */
  uncertaintyGrams: number
  /** Cylinders with contents that nobody has weighed: beside the sum, never as nothing. */
  notKnown: number
}

/** One refrigerant: everybody's account, and each owner's. */
export interface RefrigerantBalance {
  /** null = not known which, or mixed. */
  refrigerant: string | null
  account: BalanceAccount
  owners: { owner: Named | null, account: BalanceAccount }[]
}

/** What GET /api/reports/mass-balance answers. */
export interface MassBalanceAnswer {
  period: Period
  balances: RefrigerantBalance[]
}

/** One movement behind a line. */
export interface BalanceMovement {
  eventId: string
  /** Position among the movements of the same event. */
  ordinal: number
  at: string
  kind: EventKind
  cylinder: { id: string, labelCode: string | null, serial: string | null }
  refrigerant: string | null
  owner: Named | null
  cause: MovementCause
  grams: number
}

/** What GET /api/reports/mass-balance/movements answers. */
export interface BalanceMovementsAnswer extends Page<BalanceMovement> { period: Period }
