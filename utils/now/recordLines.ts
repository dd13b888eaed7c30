import { formatWholeDay } from '../quantity/day'
import { formatNear } from '../quantity/instant'
import type { NowFacts, ScaleFacts } from './nowFacts'
import type { DraftLine, NowReader } from './nowLines'
import { counted, listed } from './phrase'

/** The lines about the firm's scales, rules, people, letters and places. */
export function recordLines({ scaleChecks = [], rule, mailFailed, uncertified = [], notTakenUp = [], missing }: NowFacts, reader: NowReader): DraftLine[] {
  return [
    scaleChecks.length > 0 && scaleLine(scaleChecks),
    rule && ruleLine(rule, reader),
    mailFailed && {
      topic: 'mail-failed' as const, kind: 'att' as const, number: mailFailed.count,
      sentence: `${counted(mailFailed.count, 'letter was', 'letters were')} not sent.`, reason: `The newest is to ${mailFailed.recipient}. It is kept and can be read.`,
      verb: 'See why', to: '/mail',
    },
    uncertified.length > 0 && {
      topic: 'uncertified' as const, kind: 'att' as const, number: uncertified.length,
      sentence: `${counted(uncertified.length, 'technician has', 'technicians have')} no certification on record.`,
      reason: `${listed(uncertified)}. Whoever opens a refrigerant circuit is certified (40 CFR 82.161).`, verb: 'Write it down', to: '/people',
    },
    notTakenUp.length > 0 && {
      topic: 'not-taken-up' as const, kind: 'att' as const, number: notTakenUp.length,
      sentence: `${counted(notTakenUp.length, 'invitation is', 'invitations are')} not taken up.`, reason: `${listed(notTakenUp)}. Until then what they do is recorded by nobody.`,
      verb: reader.mayI('people:manage') ? 'Send it again' : 'See who', to: '/people',
    },
    ...missing ? missingLines(missing) : [],
  ].filter(line => !!line)
}

function scaleLine(scales: readonly ScaleFacts[]): DraftLine {
  const number = scales.length
  const lastChecks = scales.map(({ name, lastCheckOn }) => `${name} (${lastCheckOn === null ? 'not known' : formatWholeDay(lastCheckOn)})`)
  return {
    topic: 'scale-checks', kind: 'att', number,
    sentence: `${counted(number, 'scale was', 'scales were')} not checked within a year.`,
    reason: `Last check of ${listed(lastChecks)}. Every net rests on a scale; set test weights on ${number === 1 ? 'it' : 'each'} and write the day down.`,
    verb: number === 1 ? 'Write its check down' : 'See which', to: '/scales',
  }
}

function ruleLine({ fromAt, isFillRule, count }: NonNullable<NowFacts['rule']>, { now, timeZone }: NowReader): DraftLine {
  const what = isFillRule ? 'A fill rule' : 'A rule about retests and reminders'
  return {
    topic: 'rule-begins', kind: 'att', number: count,
    sentence: `${what} begins ${formatNear(fromAt, timeZone, now)}.`,
    reason: `${count === 1 ? 'From then on limits and reminders follow it' : `${count} rules are set to begin soon`}. It can be withdrawn until it begins.`,
    verb: 'Read it', to: '/rules',
  }
}

function missingLines({ shop, reclaimer, testStation, vansWithoutTechnician }: NonNullable<NowFacts['missing']>): DraftLine[] {
  const add = { kind: 'att', number: 1, verb: 'Add one' } as const
  return [
    shop && { ...add, topic: 'no-shop' as const, to: '/places', sentence: 'No shop is known yet.', reason: 'A cylinder is registered where it stands.' },
    reclaimer && { ...add, topic: 'no-reclaimer' as const, to: '/firms?kind=reclaimer', sentence: 'No reclaimer is known yet.', reason: 'No shipment can be prepared without one.' },
    testStation && { ...add, topic: 'no-test-station' as const, to: '/firms?kind=requalifier', sentence: 'No test station is known yet.', reason: 'No test lot can be prepared without one.' },
    vansWithoutTechnician.length > 0 && {
      topic: 'vans-without-technician' as const, kind: 'att' as const, number: vansWithoutTechnician.length,
      sentence: `${counted(vansWithoutTechnician.length, 'van has', 'vans have')} no technician.`,
      reason: `${listed(vansWithoutTechnician)}. What is aboard is then in nobody's hands.`, verb: 'Say whose', to: '/places',
    },
  ].filter(line => line !== false)
}
