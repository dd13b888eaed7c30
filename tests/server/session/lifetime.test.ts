import { describe, expect, it } from 'vitest'
import { sessionLimits, sessionStands } from '../../../server/utils/session/lifetime'

const HOUR = 3_600_000
const DAY = 86_400_000
const START = Date.UTC(2026, 4, 4, 8)

function used(createdAgo: number, seenAgo: number) {
  return { createdAt: START - createdAgo, lastSeenAt: START - seenAgo }
}

describe('how long a session stands', () => {
  it('stands in the office until 12 hours without use', () => {
    expect(sessionStands(used(12 * HOUR, 12 * HOUR - 1), ['warehouse'], START)).toBe(true)
    expect(sessionStands(used(12 * HOUR, 12 * HOUR), ['warehouse'], START)).toBe(false)
  })

  it('stands in the office for 7 days at most, however much it is used', () => {
    expect(sessionStands(used(7 * DAY - 1, 0), ['manager'], START)).toBe(true)
    expect(sessionStands(used(7 * DAY, 0), ['manager'], START)).toBe(false)
  })

  it('stands on a technician\'s phone until 7 days without use', () => {
    expect(sessionStands(used(7 * DAY, 7 * DAY - 1), ['technician'], START)).toBe(true)
    expect(sessionStands(used(7 * DAY, 7 * DAY), ['technician'], START)).toBe(false)
  })

  it('stands on a technician\'s phone for 30 days at most', () => {
    expect(sessionStands(used(30 * DAY - 1, 0), ['technician'], START)).toBe(true)
    expect(sessionStands(used(30 * DAY, 0), ['technician'], START)).toBe(false)
  })

  it('gives the longer limits to nobody with an office role beside, and to nobody without a role', () => {
    expect(sessionLimits(['technician', 'admin'])).toEqual({ idle: 12 * HOUR, absolute: 7 * DAY })
    expect(sessionLimits([])).toEqual({ idle: 12 * HOUR, absolute: 7 * DAY })
  })

  it('does not stand when it says it begins in the future, but forgives a clock set back by a minute', () => {
    expect(sessionStands(used(-61_000, 0), ['technician'], START)).toBe(false)
    expect(sessionStands(used(-60_000, 0), ['technician'], START)).toBe(true)
  })
})
