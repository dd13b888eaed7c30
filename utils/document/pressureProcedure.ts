/**
 * How a pressure check is done, step by step, and what follows from it.
 *
 * Source: US Army TM 5-3810-307-24-1-2 (recovered refrigerant): steady for several hours above 65 F and out of the sun,
 * the thermometer within 4 in, the gauge to 1 psi, vapor bled a little at a time and the check repeated after hours.
 */
export const PRESSURE_PROCEDURE: readonly string[] = [
  'Let the cylinder stand for several hours, above 65 °F, out of the sun and away from heat. Its temperature must be steady.',
  'Hang the thermometer within 4 in of the cylinder, in the shade.',
  'Read a gauge that is good to 1 psi, and the thermometer, at the same time.',
  'Within the band: no more gas is in it than the instruments can miss.',
  'Above the band: bleed a little vapor into recovery equipment, never to the air. Wait some hours and check again.',
  'Still above: it may be another refrigerant as well as air. It goes to a reclaimer.',
]

/** What a pressure cannot tell. Source: common practice, no source; how many overlap was computed from the catalogue. */
export const PRESSURE_LIMITS: readonly string[] = [
  'A pressure never proves a refrigerant: at one temperature most share their pressure with several others.',
  'A blend reads near its bubble pressure while it is mostly liquid, and drifts to its dew pressure as it empties.',
  'Once no liquid is left the pressure says nothing of what is in it.',
]
