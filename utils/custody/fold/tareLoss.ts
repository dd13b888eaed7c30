// 49 CFR 180.209(c): a loss of 5 % of the tare asks for a test before the next fill.
const TARE_LOSS_RATIO = 0.95

// Keeps a product of decimals from landing a hair below the edge.
const FLOAT_NOISE_GRAMS = 1e-6

/** Whether a cylinder with nothing in it has lost 5 % or more of the tare it should have. Units: grams, unrounded. */
export function isTareLoss(grams: number, officialGrams: number): boolean {
  return grams <= officialGrams * TARE_LOSS_RATIO + FLOAT_NOISE_GRAMS
}
