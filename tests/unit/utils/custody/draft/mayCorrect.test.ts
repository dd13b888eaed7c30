import { describe, expect, it } from 'vitest'
import type { Access } from '../../../../../utils/access/roles'
import type { LogLine } from '../../../../../utils/custody/cylinderView'
import { mayCorrect } from '../../../../../utils/custody/draft/mayCorrect'

const RECORDED = Date.parse('2026-03-02T15:00:00Z')
const A_DAY_LATER = Date.parse('2026-03-03T15:00:00Z')

function line(kind: LogLine['kind'] = 'weighed'): LogLine {
  return { kind, author: { id: 'tina', name: 'Tina' }, recordedAt: new Date(RECORDED).toISOString() } as LogLine
}

function person(personId: string, role: Access['roles'][number]): Access {
  return { personId, roles: [role], trainee: false }
}

describe('a line of the log', () => {
  it('is its author\'s to correct for a day from its recording', () => {
    expect(mayCorrect(line(), person('tina', 'technician'), A_DAY_LATER)).toBe(true)
    expect(mayCorrect(line(), person('tina', 'technician'), A_DAY_LATER + 1)).toBe(false)
  })

  it('is not another technician\'s to correct', () => {
    expect(mayCorrect(line(), person('ned', 'technician'), RECORDED)).toBe(false)
    expect(mayCorrect(line(), null, RECORDED)).toBe(false)
  })

  it('is a manager\'s to correct at any time, but not where its own papers mend it', () => {
    expect(mayCorrect(line(), person('max', 'manager'), A_DAY_LATER + 1)).toBe(true)
    expect(mayCorrect(line('sent-for-reclaim'), person('max', 'manager'), RECORDED)).toBe(false)
  })
})
