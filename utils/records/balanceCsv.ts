import type { BalanceAccount, Period, RefrigerantBalance } from '../contract/massBalance'
import { MOVEMENT_CAUSES } from '../custody/movement'
import { csvText } from '../picture/csvText'
import { BALANCE_LINE_WORDS, CLOSING_WORDS, OPENING_WORDS, ownerWords, refrigerantWords, UNEXPLAINED_WORDS, verdictWords } from './words'

/** The heads of a balance as a table of values. Masses are whole grams, so that a spreadsheet's own sum is the same. */
export const BALANCE_CSV_HEADS: string[] = [
  'From', 'To', 'Refrigerant', 'Owner',
  ...[
    OPENING_WORDS, ...MOVEMENT_CAUSES.map(cause => BALANCE_LINE_WORDS[cause].words), BALANCE_LINE_WORDS.apart.words, CLOSING_WORDS,
    UNEXPLAINED_WORDS, 'Uncertainty',
  ].map(words => `${words}, g`),
  'Verdict', 'Cylinders not weighed', 'Agrees with the cylinders',
]

/** One refrigerant's balance under {@link BALANCE_CSV_HEADS}, each owner a row. */
export function balanceCsvRows({ from, to }: Period, { refrigerant, owners }: RefrigerantBalance): (string | number)[][] {
  return owners.map(({ owner, account }) => [from, to, csvText(refrigerantWords(refrigerant)), csvText(ownerWords(owner)), ...figures(account)])
}

function figures({ openingGrams, causes, apart, closingGrams, unexplained, stock, agrees }: BalanceAccount): (string | number)[] {
  return [
    openingGrams, ...causes.map(({ grams }) => grams), apart.grams, closingGrams,
    unexplained.grams, unexplained.uncertaintyGrams, verdictWords(unexplained), stock.closing.notKnown, agrees ? 'yes' : 'no',
  ]
}
