import type { Month } from '../quantity/month'
import { formatMonth } from '../quantity/month'
import { formatReading } from '../quantity/mass'
import { contentsInWords } from '../custody/contentsInWords'
import type { CylinderView } from '../custody/cylinderView'
import { formatLabelCode } from '../label/code'
import { cautionsFor, STANDING_CAUTION } from './cautions'
import type { FailedResult } from './failedResult'
import type { Paper, PaperBlock } from './paper'

/** What the notice is made of, beside the cylinder. */
export interface NoticeFacts {
  result: FailedResult
  sender: { name: string, telephone: string }
  /** Whose cylinder it is; the sender itself where it is the firm's own. */
  owner: { name: string, address: string | null }
  test: { month: Month, method: 'volumetric' | 'proof' | 'visual', requalifier: string, rin: string | null }
  /** The day of printing, written out. */
  day: string
}

/** Marked below this a rejected cylinder may be repaired or rebuilt. Units: psig. Source: 49 CFR 180.205(h). */
const REPAIRABLE_BELOW_PSIG = 900

const METHODS = { volumetric: 'volumetric', proof: 'proof pressure', visual: 'an outside look' } as const

/**
 * The notice to the owner of a cylinder that failed its test.
 *
 * Source: 49 CFR 180.205(h), (i): the requalifier tells the owner in writing; this passes it on to whoever owns it.
 */
export function ownerNotice(view: CylinderView, facts: NoticeFacts): Paper {
  const { result, sender, owner, test, day } = facts
  const isCondemned = result === 'condemned'
  const items = (texts: readonly string[]): PaperBlock[] => texts.map(text => ({ kind: 'item', text }))
  return {
    sender: [sender.name, `Telephone ${sender.telephone}`, day],
    foot: `Notice to the owner, ${nameOf(view)}, ${day}`,
    blocks: [
      { kind: 'text', text: ['To the owner:', owner.name, ...(owner.address === null ? [] : [owner.address])].join('\n') },
      { kind: 'title', text: isCondemned ? 'Notice to the owner: cylinder condemned' : 'Notice to the owner: cylinder rejected' },
      { kind: 'text', text: `The cylinder below is yours by our record. At its requalification it was ${isCondemned ? 'condemned' : 'rejected'}. Its owner is told of that in writing (49 CFR 180.205).` },
      { kind: 'facts', rows: cylinderRows(view) },
      { kind: 'heading', text: 'The test' },
      { kind: 'facts', rows: [
        { term: 'Result', value: isCondemned ? 'condemned' : 'rejected' },
        { term: 'Month', value: formatMonth(test.month) },
        { term: 'How', value: METHODS[test.method] },
        { term: 'Requalifier', value: [test.requalifier, test.rin && `RIN ${test.rin}`].filter(Boolean).join(', ') },
      ] },
      { kind: 'heading', text: 'What this means' },
      ...items(isCondemned ? CONDEMNED : rejectedItems(view)),
      { kind: 'heading', text: 'What is in it and where it is' },
      { kind: 'text', text: `${contentsInWords(view)} ${view.place ? `By our log it is at ${view.place.name}.` : 'By our log its place is not known.'}` },
      { kind: 'heading', text: 'What we ask of you' },
      ...items(isCondemned ? ASKED_WHEN_CONDEMNED : ASKED_WHEN_REJECTED),
      { kind: 'heading', text: 'Take care' },
      ...items([...cautionsFor(['handling', 'storing', ...(isUnknown(view) ? ['unknown-contents' as const] : [])]), STANDING_CAUTION]),
      { kind: 'signatures', lines: [`For ${sender.name}`, 'Day', 'Received by the owner'] },
    ],
  }
}

const CONDEMNED: readonly string[] = [
  'It is never filled again with a hazardous material, and never offered for transportation where a specification packaging is asked for.',
  'No repair, no rebuilding and no other test brings it back.',
  'The requalifier marks it: CONDEMNED, or a row of X over its specification and pressure. Nobody takes that mark off. At your direction it is made unable to hold pressure instead.',
]

function rejectedItems({ stamp }: CylinderView): string[] {
  const pressure = stamp?.servicePressurePsig ?? null
  return [
    'It is not filled, and it bears no mark of this test.',
    pressure !== null && pressure < REPAIRABLE_BELOW_PSIG
      ? `Marked below ${REPAIRABLE_BELOW_PSIG} psig it may be repaired or rebuilt, and is inspected and tested again after that.`
      : 'The requalifier says whether it may be repaired.',
    'Only a passed test brings it back into use.',
  ]
}

const ASKED_WHEN_CONDEMNED: readonly string[] = [
  'Tell us whether we may have it made unusable and scrapped, or whether you take it back.',
  'Whatever is still in it is drawn into another cylinder before it leaves.',
]
const ASKED_WHEN_REJECTED: readonly string[] = [
  'Tell us whether it is to be repaired and tested again, or given up.',
]

function cylinderRows(view: CylinderView): { term: string, value: string }[] {
  const { stamp, labelCode } = view
  const rows: [string, string | null | undefined][] = [
    ['Label', labelCode && formatLabelCode(labelCode)],
    ['Serial number', stamp?.serial ?? 'cannot be read'],
    ['Maker', stamp?.maker],
    ['Specification', stamp && `${stamp.spec}${stamp.servicePressurePsig === null ? '' : `, ${stamp.servicePressurePsig} psig`}`],
    ['Tare weight (TW)', stamp?.tareWeight && formatReading(stamp.tareWeight)],
    ['Water capacity (WC)', stamp?.waterCapacity && formatReading(stamp.waterCapacity)],
    ['Made', stamp?.madeMonth && formatMonth(stamp.madeMonth)],
  ]
  return rows.flatMap(([term, value]) => value ? [{ term, value }] : [])
}

function nameOf({ labelCode, stamp }: CylinderView): string {
  if (labelCode !== null) return formatLabelCode(labelCode)
  return stamp?.serial ? `serial ${stamp.serial}` : 'cylinder without a label'
}

function isUnknown({ contents }: CylinderView): boolean {
  return !contents.nothingInIt && contents.refrigerant === null
}
