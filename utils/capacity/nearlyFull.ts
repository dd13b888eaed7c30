/** From this part of the limit on a cylinder is nearly full: common practice, no source. */
export const NEARLY_FULL_RATIO = 0.9
