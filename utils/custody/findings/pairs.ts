import type { Finding } from '../finding'
import { withOtherHalf, type Half, type HalfTransfer } from '../half'
import { massWords, OWN_RULE, sinceText } from './words'

/** What a cylinder's halves and those of the others that name it say of each other. */
export function pairFindings(mine: readonly Half[], others: readonly Half[]): Finding[] {
  return withOtherHalf(mine, others).flatMap(({ half, other }) => {
    if (other === null) return [halfTransfer(half)]
    if (half.transfer === null || other.transfer === null) return []
    return half.direction === 'out' ? unbalanced(half.at, half.transfer, other.transfer) : unbalanced(half.at, other.transfer, half.transfer)
  })
}

/** The other half is not in the log. */
function halfTransfer({ kind, direction, at }: Half): Finding {
  const what = kind === 'transferred'
    ? `Only this cylinder's half of a transfer is recorded: ${direction === 'out' ? 'what went out of it' : 'what came into it'}`
    : `Only this cylinder's half of an exchange is recorded: that it ${direction === 'out' ? 'went out' : 'came in'}`
  return {
    code: 'half-transfer', severity: 'caution', source: OWN_RULE, since: sinceText(at),
    text: `${what}. Record the other cylinder's half, or take this entry out.`,
  }
}

function unbalanced(at: number, out: HalfTransfer, into: HalfTransfer): Finding[] {
  if (out.refrigerant !== into.refrigerant) {
    return [transferUnbalanced(at, `One half of a transfer names ${named(out.refrigerant)}, the other ${named(into.refrigerant)}. Correct the one that is wrong.`)]
  }
  if (out.grams === null || into.grams === null) return []
  const within = out.accuracyGrams + into.accuracyGrams
  if (Math.abs(out.grams - into.grams) <= within) return []
  return [transferUnbalanced(at,
    `By the scales ${signedWords(out.grams)} went out of one cylinder and ${signedWords(into.grams)} into the other; the four readings explain ${massWords(within, 'down')} of difference. Weigh both again.`)]
}

function transferUnbalanced(at: number, text: string): Finding {
  return { code: 'transfer-unbalanced', severity: 'caution', source: OWN_RULE, since: sinceText(at), text }
}

function named(refrigerant: string | null): string {
  return refrigerant ?? 'a refrigerant that is not known'
}

function signedWords(grams: number): string {
  return grams < 0 ? `minus ${massWords(-grams, 'nearest')}` : massWords(grams, 'nearest')
}
