/** What is printed where a fact is not known. */
export const NOT_KNOWN = '–'

/** What of the collar stamp stands on the label, as entered; null is not known. */
export interface LabelledStamp {
  serial: string | null
  /** As 'DOT-4BA'. */
  spec: string | null
  servicePressurePsig: number | null
  /** With its unit, as '27.9 lb'. */
  tareWeight: string | null
  waterCapacity: string | null
}

/** What an identity label says. Without a stamp it is a blank one, bound to a cylinder later. */
export interface IdentityLabelContent {
  code: string
  payload: string
  owner: string
  telephone: string | null
  copy: 1 | 2
  stamp: LabelledStamp | null
}

/** One fact of the collar; `value` is null on a blank label, which has a line to write on in its place. */
export interface LabelFact { name: 'SN' | 'Spec' | 'TW' | 'WC', value: string | null }

/** Serial, specification, tare weight and water capacity, in this order. */
export function labelFacts(stamp: LabelledStamp | null): [LabelFact, LabelFact, LabelFact, LabelFact] {
  const value = (known: string | null | undefined) => stamp === null ? null : known ?? NOT_KNOWN
  return [
    { name: 'SN', value: value(stamp?.serial) },
    { name: 'Spec', value: value(stamp && specMark(stamp)) },
    { name: 'TW', value: value(stamp?.tareWeight) },
    { name: 'WC', value: value(stamp?.waterCapacity) },
  ]
}

/** A name longer than so many characters on two lines, broken between words near its middle: on one it would be too small to read. */
export function ownerLines(owner: string, longest: number): [string] | [string, string] {
  const gaps = [...owner].flatMap((sign, at) => sign === ' ' ? [at] : [])
  if (owner.length <= longest || gaps.length === 0) return [owner]
  const middle = owner.length / 2
  const at = gaps.reduce((best, gap) => Math.abs(gap - middle) < Math.abs(best - middle) ? gap : best)
  return [owner.slice(0, at), owner.slice(at + 1)]
}

/** Specification and service pressure as one mark, as on the collar; apart where the digits would run together. */
function specMark({ spec, servicePressurePsig }: LabelledStamp): string | null {
  if (spec === null && servicePressurePsig === null) return null
  const pressure = servicePressurePsig === null ? NOT_KNOWN : String(servicePressurePsig)
  const runsTogether = spec !== null && servicePressurePsig !== null && /\D$/.test(spec)
  return `${spec ?? NOT_KNOWN}${runsTogether ? '' : ' '}${pressure}`
}
