import type { Access } from '~~/utils/access/roles'
import type { CustodyEvent } from '~~/utils/custody/event'
import type { Finding } from '~~/utils/custody/finding'
import { fold } from '~~/utils/custody/fold'
import { mayShip } from '~~/utils/custody/plan'
import { preview } from '~~/utils/custody/preview'
import { view } from '~~/utils/custody/view'
import { dayOfInstant } from '~~/utils/quantity/day'
import type { MassReading } from '~~/utils/quantity/mass'
import { contaminationPercent } from '~~/utils/reclaim/contamination'
import { refusedBy } from '~~/utils/reclaim/terms'
import { viewContext } from '../custody/foldContext'
import { logsOf } from '../custody/logPages'
import { saidByOthers } from '../custody/saidByOthers'
import type { Database } from '../database/database'
import { directory } from '../directory/directory'
import { termsOn } from '../reclaim/terms'

/** A line as it would leave: why it may not, and the figures that its papers take; the gross is null where it was not weighed. */
export interface JudgedLine {
  cylinderId: string
  because: Finding[]
  figures: { gross: MassReading | null, refrigerant: string | null, condition: string, netGrams: number | null }
}

/** A line that is to be judged: with what the scale showed, null where it was not weighed. */
export interface LineToJudge { cylinderId: string, gross: MassReading | null }

/** Who asks, when, and which reclaimer takes the lines. */
export interface Judging { toFirmId: string, access: Access, nowMs: number }

/**
 * Each line judged as its cylinder stands once the weight read is known: by the rules of the trade, and by what the
 * reclaimer takes where that is recorded.
 */
export async function judgeLines(db: Database, lines: readonly LineToJudge[], { toFirmId, access, nowMs }: Judging): Promise<{ lines: JudgedLine[], hasTerms: boolean }> {
  const ids = lines.map(line => line.cylinderId)
  const from = await directory(db)
  const [said, logs, terms] = await Promise.all([saidByOthers(db, ids), logsOf(db, ids), termsOn(db, toFirmId, dayOfInstant(nowMs, from.timeZone))])
  const judged = lines.map(({ cylinderId, gross }): JudgedLine => {
    const context = viewContext(from, { access, nowMs, saidByOthers: said(cylinderId) })
    const events = logs.get(cylinderId) ?? []
    const before = view(fold(events, context).state, context)
    const then = gross === null ? before : preview(events, weighing(cylinderId, gross, nowMs), context).view
    // A weighing brings a cylinder back that is recorded as away; that must be recorded first, not guessed.
    const away = gross === null ? [] : mayShip(before).because.filter(({ code }) => code === 'away')
    return {
      cylinderId,
      because: [...away, ...mayShip(then).because, ...(terms === null ? [] : refusedBy(terms, then, contaminationPercent(events)))],
      figures: { gross, refrigerant: then.contents.refrigerant, condition: then.contents.condition, netGrams: then.contents.netGrams },
    }
  })
  return { lines: judged, hasTerms: terms !== null }
}

function weighing(cylinderId: string, gross: MassReading, nowMs: number): CustodyEvent<'weighed'> {
  return { id: 'weighing', cylinderId, kind: 'weighed', occurredAt: new Date(nowMs).toISOString(), deviceId: '', deviceSeq: 0, details: { gross } }
}
