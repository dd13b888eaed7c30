/** How often cylinders of a specification are requalified. Units: months. */
export type SpecPeriod = {
  /** The shortest period, which counts without any choice of the owner's; null where the regulation names none. */
  months: number | null
  /** Whether the specification is requalified at all. */
  requalified: boolean
}

function years(shortest: number): SpecPeriod {
  return { months: shortest * 12, requalified: true }
}

const NEVER: SpecPeriod = { months: null, requalified: false }

/**
 * The specifications a stamp can name, with their requalification periods.
 *
 * Source: 49 CFR 180.209 Table 1 to paragraph (a); a DOT-39 may not be refilled, 49 CFR 178.65(i). A special permit
 * (DOT-SP) names its own period.
 */
export const SPECS: Readonly<Record<string, SpecPeriod>> = {
  'DOT-3A': years(5),
  'DOT-3AA': years(5),
  'DOT-3A480X': years(5),
  'DOT-3AL': years(5),
  'DOT-3AX': years(5),
  'DOT-3AAX': years(5),
  'DOT-3B': years(5),
  'DOT-3BN': years(5),
  'DOT-3E': NEVER,
  'DOT-3HT': years(3),
  'DOT-3T': years(5),
  'DOT-4AA480': years(5),
  'DOT-4B': years(5),
  'DOT-4BA': years(5),
  'DOT-4BW': years(5),
  'DOT-4B240ET': years(5),
  'DOT-4D': years(5),
  'DOT-4DA': years(5),
  'DOT-4DS': years(5),
  'DOT-4E': years(5),
  'DOT-4L': NEVER,
  'DOT-8': years(10),
  'DOT-8AL': years(10),
  'DOT-39': NEVER,
  'DOT-SP': { months: null, requalified: true },
}

// Specification 3 stands in the lists of 49 CFR 173.304a only, so its period is not known here.
const SPEC_NAMES = [...Object.keys(SPECS), 'DOT-3'].sort((a, b) => b.length - a.length)
const PRESSURE_TAIL = /^(?:NRC)?-?(\d{2,4})?(?:[/M].*)?$/
const SPECIAL_PERMIT = /^DOT-(?:SP|E)-?\d{3,5}/

/** A specification and the service pressure that stand in one mark. */
export type SpecMark = { spec: string, servicePressurePsig: number | null }

/**
 * The specification and the service pressure of a mark, or null where it names no known specification.
 *
 * @example splitSpec('DOT-4BA400') // { spec: 'DOT-4BA', servicePressurePsig: 400 }
 */
export function splitSpec(text: string): SpecMark | null {
  const mark = `DOT-${text.toUpperCase().replace(/\s+/g, '').replace(/^DOT-?/, '')}`
  if (SPECIAL_PERMIT.test(mark)) return { spec: 'DOT-SP', servicePressurePsig: null }
  for (const spec of SPEC_NAMES) {
    if (!mark.startsWith(spec)) continue
    const tail = PRESSURE_TAIL.exec(mark.slice(spec.length))
    if (tail) return { spec, servicePressurePsig: tail[1] ? Number(tail[1]) : impliedServicePressurePsig(spec) }
  }
  return null
}

/**
 * The service pressure of a specification that carries none of its own in the mark, or null.
 *
 * Source: 49 CFR 173.301a(b): specifications 3 and 3E count as 1800 psig, 8 as 250 psig; the others name it (4AA480).
 */
export function impliedServicePressurePsig(spec: string): number | null {
  switch (spec) {
    case 'DOT-3':
    case 'DOT-3E': return 1800
    case 'DOT-8': return 250
    case 'DOT-3A480X':
    case 'DOT-4AA480': return 480
    case 'DOT-4B240ET': return 240
    default: return null
  }
}
