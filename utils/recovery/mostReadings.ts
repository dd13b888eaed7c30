/** Most readings of the scale that are kept of one recovery. */
export const MOST_READINGS = 200
