/** How long a dock link may be good; the usual one is {@link USUAL_LINK_DAYS}. Units: days. */
export const LINK_DAYS = [7, 30, 90] as const

export type LinkDays = (typeof LINK_DAYS)[number]

/** A statement mostly comes within a month of the load. Common practice, no source. */
export const USUAL_LINK_DAYS: LinkDays = 30
