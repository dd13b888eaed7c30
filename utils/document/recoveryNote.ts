import type { JobAnswer, JobDraw, JobFill, NamedCylinder } from '../contract/jobs'
import { massWords } from '../custody/findings/words'
import { formatLabelCode } from '../label/code'
import { formatDay, formatTime, wallClock } from '../quantity/instant'
import { formatReading, readingGrams } from '../quantity/mass'
import { CIRCUMSTANCES_WORDS, formatCharge, levelWords, MACHINE_MADE_WORDS } from '../recovery/words'
import { methodWords } from '../recovery/methods'
import { heldWords } from '../recovery/verdictWords'
import { cautionsFor, STANDING_CAUTION } from './cautions'
import type { Paper, PaperBlock } from './paper'

/** What the note is made of, beside the job. */
export interface NoteFacts {
  sender: { name: string, telephone: string, address: string | null }
  /** The name of whose refrigerant it is; null = the sender's. */
  ownerName: (ownerId: string | null) => string
  timeZone: string
  printedMs: number
}

const NOT_KNOWN = 'not known'

/**
 * The note that tells a customer what was recovered from their equipment. What nobody knows is said to be not known.
 *
 * Source of what it holds: 40 CFR 82.156(a)(3)(i) (company, place, day, refrigerant) and, of what was removed, 82.157(b) and
 * 84.106(b); the rest is common practice, no source.
 */
export function recoveryNote(job: JobAnswer, facts: NoteFacts): Paper {
  const { sender, timeZone, printedMs } = facts
  const counting = job.fills.filter(({ apart }) => apart === null)
  const apart = job.fills.filter(fill => fill.apart !== null)
  const title = `Recovery note ${job.number}`
  return {
    sender: [sender.name, ...(sender.address === null ? [] : [sender.address]), `Telephone ${sender.telephone}`],
    foot: `${title}, issue ${job.issue}, as recorded by ${instantOf(printedMs, timeZone)}`,
    ...(job.issue > 1 && { mark: `Issue ${job.issue}` }),
    blocks: [
      { kind: 'title', text: title },
      ...issueBlocks(job, timeZone),
      { kind: 'facts', rows: [
        { term: 'Customer', value: job.customer.name },
        { term: 'Site', value: job.site },
        { term: 'Equipment', value: job.equipment },
        { term: 'Day of the recovery', value: daysOf(job, timeZone) },
        { term: 'Refrigerant', value: refrigerantsOf(job) },
        { term: 'Full charge', value: job.charge === null ? NOT_KNOWN : formatCharge(readingGrams(job.charge)) },
      ] },
      { kind: 'heading', text: 'What was recovered' },
      ...(counting.length > 0 ? [fillTable(counting, job, facts)] : [{ kind: 'text' as const, text: 'Nothing that counts was recorded of this job.' }]),
      ...apartBlocks(apart, job, facts),
      ...drawBlocks(job.draws, timeZone),
      { kind: 'heading', text: 'How, and down to what' },
      { kind: 'facts', rows: levelRows(job) },
      { kind: 'heading', text: 'Who did it' },
      ...doerItems(job.fills),
      { kind: 'heading', text: 'Whose it is, and what becomes of it' },
      ...fateItems(job, counting, facts),
      ...(job.note === null ? [] : [{ kind: 'heading' as const, text: 'Note' }, { kind: 'text' as const, text: job.note }]),
      ...cautionBlocks(job),
      { kind: 'signatures', lines: ['Technician', `For ${sender.name}`, 'For the customer', 'Day'] },
    ],
  }
}

function issueBlocks({ issue, corrections }: JobAnswer, timeZone: string): PaperBlock[] {
  if (issue === 1) return []
  return [
    { kind: 'text', text: `Issue ${issue}. It replaces every issue before it: something was corrected since the first.` },
    ...corrections.map(({ at, reason }): PaperBlock => ({ kind: 'item', text: `Corrected on ${dayOf(Date.parse(at), timeZone)}: ${reason}` })),
  ]
}

function fillTable(fills: readonly JobFill[], job: Pick<JobAnswer, 'recoveredGrams'>, { ownerName }: NoteFacts, withTotal = true): PaperBlock {
  const unknown = fills.filter(({ netGrams }) => netGrams === null).length
  const total = job.recoveredGrams === null ? NOT_KNOWN : `${massWords(job.recoveredGrams, 'nearest')}${unknown > 0 ? `, and ${unknown} ${NOT_KNOWN}` : ''}`
  return {
    kind: 'table',
    columns: [
      { head: 'Cylinder', share: 26 }, { head: 'Refrigerant', share: 14 }, { head: 'Gross before', share: 15, align: 'right' },
      { head: 'Gross after', share: 15, align: 'right' }, { head: 'Net recovered', share: 24, align: 'right' }, { head: 'Whose', share: 22 },
    ],
    rows: fills.map(fill => [
      cylinderWords(fill.cylinder),
      fill.refrigerant ?? NOT_KNOWN,
      fill.grossBefore === null ? 'not weighed' : formatReading(fill.grossBefore),
      formatReading(fill.grossAfter),
      fill.netGrams === null ? NOT_KNOWN : massWords(fill.netGrams, 'nearest'),
      ownerName(fill.ownerId),
    ]),
    ...(withTotal && { totals: ['Total', '', '', '', total, ''] }),
  }
}

function apartBlocks(fills: readonly JobFill[], job: JobAnswer, facts: NoteFacts): PaperBlock[] {
  if (fills.length === 0) return []
  return [
    { kind: 'text', text: 'Apart from the total stand practice, and a trainee’s entries that wait for their supervisor’s signature:' },
    fillTable(fills, job, facts, false),
  ]
}

const PURPOSES: Record<JobDraw['purpose'], string> = {
  'same-system': 'went back into the system it came from', 'same-owner': 'went into other equipment of its owner', 'sampling': 'was taken as a sample', 'other': 'was drawn for something else',
}

function drawBlocks(draws: readonly JobDraw[], timeZone: string): PaperBlock[] {
  return draws.filter(({ apart }) => apart === null).map(({ cylinder, netGrams, purpose, at }) => ({
    kind: 'item', text: `Out of ${cylinderWords(cylinder)}, ${netGrams === null ? 'an amount that is not known' : massWords(netGrams, 'nearest')} ${PURPOSES[purpose]} on ${dayOf(Date.parse(at), timeZone)}.`,
  }))
}

function levelRows({ fills, required, opened }: JobAnswer): { term: string, value: string }[] {
  const methods = [...new Set(fills.map(({ method }) => method === null ? NOT_KNOWN : methodWords(method)))]
  const last = fills.findLast(({ reached }) => reached !== null)?.reached
  return [
    { term: 'Method', value: methods.join(', ') || NOT_KNOWN },
    { term: 'Why it was opened', value: opened?.circumstances ? CIRCUMSTANCES_WORDS[opened.circumstances] : NOT_KNOWN },
    { term: 'Recovery machine', value: opened?.machineMade ? `made ${MACHINE_MADE_WORDS[opened.machineMade]}` : 'date not known' },
    { term: 'Vacuum required', value: [levelWords(required.level), required.alternative && `or ${levelWords(required.alternative)}`, `(${required.source})`].filter(Boolean).join(' ') },
    ...(required.assumed.length > 0 ? [{ term: 'Taken for granted', value: required.assumed.join('\n') }] : []),
    { term: 'Vacuum reached', value: last ? [VERDICTS[last.verdict], last.because, heldWords(last)].filter(Boolean).join(' ') : NOT_KNOWN },
  ]
}

const VERDICTS = { 'reached': 'Reached.', 'not-reached': 'Not reached.', 'unknown': 'Not known.' } as const

function doerItems(fills: readonly JobFill[]): PaperBlock[] {
  const people = [...new Map(fills.flatMap(({ by, supervisor }) => [
    [by.id, `${by.name}: certification ${by.certification ?? NOT_KNOWN}`] as const,
    ...(supervisor ? [[supervisor.id, `${supervisor.name}, who supervised: certification ${supervisor.certification ?? NOT_KNOWN}`] as const] : []),
  ])).values()]
  return (people.length > 0 ? people : [NOT_KNOWN]).map(text => ({ kind: 'item', text }))
}

function fateItems({ keeps, customer }: JobAnswer, fills: readonly JobFill[], { ownerName, sender }: NoteFacts): PaperBlock[] {
  const owners = fills.length > 0 ? [...new Set(fills.map(({ ownerId }) => ownerId))] : [keeps === 'customer' ? customer.id : null]
  const texts = owners.map(ownerId => ownerId === null
    ? `It was left to ${sender.name}.`
    : `It stays the property of ${ownerName(ownerId)}. ${sender.name} keeps it in that name until it goes back into equipment of the same owner, or to a reclaimer.`)
  return [...texts, 'It goes to nobody else before a certified reclaimer has reclaimed it, unless solely to be reclaimed or destroyed (40 CFR 82.154(d)).', 'It is not released to the air (40 CFR 82.154(a)).']
    .map(text => ({ kind: 'item', text }))
}

function cautionBlocks({ cautions }: JobAnswer): PaperBlock[] {
  return [
    { kind: 'heading', text: 'Take care' },
    ...cautions.map(({ text, source }): PaperBlock => ({ kind: 'item', text: `${text} (${source})` })),
    ...[...cautionsFor(['handling', 'storing']), STANDING_CAUTION].map((text): PaperBlock => ({ kind: 'item', text })),
  ]
}

function cylinderWords({ labelCode, serial }: NamedCylinder): string {
  return [labelCode && formatLabelCode(labelCode), serial === null ? 'serial not known' : `serial ${serial}`].filter(Boolean).join(', ')
}

function refrigerantsOf({ refrigerant, fills }: JobAnswer): string {
  const names = new Set([...(refrigerant === null ? [] : [refrigerant]), ...fills.flatMap(fill => fill.refrigerant ?? [])])
  return [...names].join(' and ') || NOT_KNOWN
}

function daysOf({ fills }: JobAnswer, timeZone: string): string {
  return [...new Set(fills.map(({ at }) => dayOf(Date.parse(at), timeZone)))].join(', ') || NOT_KNOWN
}

function dayOf(ms: number, timeZone: string): string {
  return `${formatDay(ms, timeZone)} ${wallClock(ms, timeZone).year}`
}

function instantOf(ms: number, timeZone: string): string {
  return `${dayOf(ms, timeZone)} ${formatTime(ms, timeZone)}`
}
