import { z } from 'zod'
import type { Past } from '../custody/asItStood'

const instant = z.iso.datetime({ offset: true, message: 'must be an instant with its offset, such as 2026-12-01T09:30:00Z' })

/** How a query asks for the past: `asOf` by what had happened, `knownAt` by what was known. */
export const pastQuery = { asOf: instant.optional(), knownAt: instant.optional() }

/** The past that a query asks for; null where it asks for the present. */
export function pastIn({ asOf, knownAt }: { asOf?: string, knownAt?: string }): Past | null {
  if (asOf === undefined && knownAt === undefined) return null
  return { asOf: asOf === undefined ? null : Date.parse(asOf), knownAt: knownAt === undefined ? null : Date.parse(knownAt) }
}

/** What GET /api/fleet/as-it-stood answers: how far the fleet of a past instant is made. Units: events. */
export interface PastProgress { done: number, of: number, isReady: boolean }
