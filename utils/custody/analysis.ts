/** What the parts of an analysis may come to, in percent: figures are rounded before they are printed, and then add up to more. */
export const MOST_PERCENT_TOGETHER = 101
