/** A kind of work or thing that a caution belongs to. */
export type CautionTopic = 'filling' | 'handling' | 'moving' | 'storing' | 'checking' | 'transferring' | 'unknown-contents' | 'flammable' | 'not-refillable'

const CAUTIONS: Record<CautionTopic, readonly string[]> = {
  'filling': [
    'Wear eye and hand protection: escaping liquid freezes skin and eyes.',
    'Watch the scale to the stop weight; do not go by time or by feel.',
    'Put one refrigerant in a cylinder, never a second.',
    'Work where air moves: vapor gathers low and pushes the air out.',
  ],
  'handling': [
    'Wear eye and hand protection.',
    'Never warm a cylinder above 125 °F, and never with a flame.',
    'Keep out of low, closed places where vapor can gather.',
  ],
  'moving': [
    'Stand it upright, tie it down, and put the valve caps on.',
    'Keep the load out of heat: a closed vehicle in the sun gets hot.',
  ],
  'storing': [
    'Keep it upright, secured, dry, and below 125 °F.',
    'Keep full, empty and unknown cylinders apart.',
  ],
  'checking': [
    'Wear eye and hand protection: a gauge line holds refrigerant at cylinder pressure.',
    'Bleed vapor into recovery equipment only, never to the air.',
    'Never warm a cylinder above 125 °F, and never with a flame.',
    'Do not open a cylinder whose contents nobody can name; leave it to an analysis.',
  ],
  'transferring': [
    'Only certified persons transfer refrigerant.',
    'Weigh both cylinders with the hoses off, before and after.',
    'The stop weight governs: stop there, whatever a plan says.',
    'Once both stand at one pressure nothing flows by itself any more: use a recovery machine made for the refrigerant.',
    'Never warm a cylinder above 125 °F, and never with a flame.',
  ],
  'unknown-contents': [
    'Do not open the valve. What is in it may burn, poison or stand at high pressure.',
    'Set it apart and mark it until it is identified.',
  ],
  'flammable': [
    'Use only cylinders and machines marked for flammable refrigerant.',
    'Keep sparks and flames away, and let air through.',
  ],
  'not-refillable': [
    'A non-refillable cylinder is never filled again, whatever it held.',
  ],
}

/** What holds for every piece of work with a cylinder. */
export const STANDING_CAUTION = 'Follow the cylinder’s own marking, local code and the authority. Certified persons only. Collarbook computes; it does not license.'

/**
 * Gives the short cautions for some topics, each once: of two that begin alike the one that says more.
 *
 * Source: common practice, no source; the heat limit is the one usually stamped or printed on cylinders (from memory).
 */
export function cautionsFor(topics: readonly CautionTopic[]): string[] {
  const all = [...new Set(topics.flatMap(topic => CAUTIONS[topic]))]
  return all.filter(caution => !all.some(other => other.startsWith(`${caution.slice(0, -1)}:`)))
}
