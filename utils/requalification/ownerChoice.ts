import type { Month } from '../quantity/month'

/** The paragraphs of 49 CFR 180.209 by which an owner may choose another period or another kind of test. */
export const CHOICE_PARAGRAPHS = ['180.209(b)', '180.209(e)', '180.209(g)', '180.209(h)'] as const
export type ChoiceParagraph = (typeof CHOICE_PARAGRAPHS)[number]

/** That the owner's cylinders meet a paragraph, and why the owner holds so. */
export type OwnerChoice = {
  paragraph: ChoiceParagraph
  reason: string
  /** Only periods that begin in this month or later are by the choice; null where the cylinders were never in another service. */
  from: Month | null
}

/** What the owner has settled about the tests of its cylinders. */
export type RetestRules = {
  /** The owner's own longest period, and that of a special permit, which names one; null = by the regulation. Units: months. */
  intervalMonths: number | null
  ownerChoices: readonly OwnerChoice[]
}

/** What a paragraph gives and what it asks, in words for whoever chooses it. */
export type ChoiceTerms = {
  gives: string
  specs: readonly string[]
  conditions: readonly string[]
}

/** What "commercially free from corroding components" asks of a gas. Source: 49 CFR 180.203. */
export const FREE_OF_CORRODING = 'Commercially free from corroding components: less than 55 ppm of moisture and nothing that attacks the steel '
  + '(49 CFR 180.203). Recovered refrigerant is not known to be that before it is analyzed.'

/**
 * The terms of each paragraph that an owner may choose.
 *
 * Source: 49 CFR 180.209(b), (g), (h) in the edition of October 2019; (e) as amended in 2020, as quoted.
 */
export const CHOICE_TERMS: Readonly<Record<ChoiceParagraph, ChoiceTerms>> = {
  '180.209(b)': {
    gives: '10 years after a volumetric test that is marked with a star',
    specs: ['DOT-3A', 'DOT-3AA'],
    conditions: [
      'Made after 1945, with a water capacity of at most 125 lb.',
      'Used for nothing but the gases of the paragraph, such as fluorinated hydrocarbons, commercially free from corroding components.',
      'Tapped with a hammer before each refill, and dried at once after each test.',
    ],
  },
  '180.209(e)': {
    gives: '12 years after it was made; then 12 years after a volumetric test, 10 after a proof pressure test (S)',
    specs: ['DOT-4B', 'DOT-4BA', 'DOT-4BW', 'DOT-4E'],
    conditions: [
      'Coated outside against corrosion.',
      'Used for nothing but a noncorrosive gas that is commercially free from corroding components.',
    ],
  },
  '180.209(g)': {
    gives: 'an outside look (E) in place of the test when it falls due, then every 5 years',
    specs: ['DOT-3A', 'DOT-3AA', 'DOT-3A480X', 'DOT-4B', 'DOT-4BA', 'DOT-4BW', 'DOT-4E'],
    conditions: [
      'Used for nothing but fluorinated hydrocarbons, or another service of the paragraph, commercially free from corroding components.',
      'Looked at by the holder of a RIN, with a record, and checked for leaks with soap solution.',
    ],
  },
  '180.209(h)': {
    gives: '10 years, for cylinders dedicated to ammonia (R-717)',
    specs: ['DOT-3A', 'DOT-3A480X', 'DOT-4AA480'],
    conditions: [
      'Used for nothing but ammonia that is commercially free from corroding components.',
      'Coated outside against corrosion.',
    ],
  },
}
