import { describe, expect, it } from 'vitest'
import { fleetQuestions } from '../../../../utils/now/fleetQuestions'
import { NOW_TOPICS, topicOrder, topicsFor } from '../../../../utils/now/nowTopics'

describe('what may wait for whom', () => {
  it('is for a technician only what that person holds, drives, has to sign and may carry out', () => {
    expect([...topicsFor(['technician'])].filter(topic => !topic.startsWith('held-'))).toEqual(['van-load', 'to-countersign', 'plan-steps'])
  })

  it('is for the auditor the log alone, and for the administrator neither the log nor cylinders', () => {
    expect([...topicsFor(['auditor'])].sort()).toEqual(['corrections', 'doubtful-times', 'late-entries', 'log-broken', 'log-unchecked'])
    expect(topicsFor(['admin']).has('overfilled')).toBe(false)
    expect(topicsFor(['admin']).has('log-broken')).toBe(false)
  })

  it('is with two roles what waits for either, and nothing without any', () => {
    expect(topicsFor(['technician', 'admin']).has('held-full')).toBe(true)
    expect(topicsFor(['technician', 'admin']).has('mail-failed')).toBe(true)
    expect(topicsFor([]).size).toBe(0)
  })

  it('leaves no sort of thing to nobody', () => {
    const all = topicsFor(['technician', 'warehouse', 'manager', 'auditor', 'admin'])
    expect(NOW_TOPICS.filter(topic => !all.has(topic))).toEqual([])
  })

  it('puts what can hurt before what wants doing', () => {
    expect(['full', 'corrections', 'overfilled', 'not-seen'].sort((a, b) => topicOrder(a as 'full', b as 'full'))).toEqual(['overfilled', 'not-seen', 'full', 'corrections'])
  })
})

describe('the questions asked of the fleet', () => {
  it('are about what the technician holds, and of nobody else', () => {
    const asked = fleetQuestions(topicsFor(['technician']), 'tina')
    expect(asked).toContainEqual(['held-overfilled', { finding: 'overfill', holder: 'tina' }])
    expect(asked.every(([, question]) => question.holder === 'tina')).toBe(true)
  })

  it('are none for the auditor and the administrator', () => {
    expect(fleetQuestions(topicsFor(['auditor', 'admin']), 'otto')).toEqual([])
  })
})
