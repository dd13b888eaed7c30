/** No refrigerant liquid is denser than so many times water: common practice, from memory. */
export const DENSEST_OVER_WATER = 1.5
