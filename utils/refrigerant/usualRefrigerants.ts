/** What contractors recover most. Source: common practice, no source. */
export const USUAL_REFRIGERANTS = ['R-410A', 'R-22', 'R-134a', 'R-404A', 'R-32', 'R-454B'] as const
