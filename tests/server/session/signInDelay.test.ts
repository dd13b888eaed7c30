import { describe, expect, it } from 'vitest'
import { createSignInDelays } from '../../../server/utils/session/signInDelay'

const NOW = 1_000_000_000

function fail(delays: ReturnType<typeof createSignInDelays>, times: number, email: string, address: string, now = NOW) {
  for (let n = 0; n < times; n++) delays.begin(email, address, now)
}

describe('guessing one person\'s password from one address', () => {
  it('is free five times, then has to wait 1 s, 2 s, 4 s', () => {
    const delays = createSignInDelays()
    for (let n = 0; n < 5; n++) expect(delays.begin('ann', '10.0.0.1', NOW).wait).toBe(0)
    expect(delays.begin('ann', '10.0.0.1', NOW).wait).toBe(1000)
    expect(delays.begin('ann', '10.0.0.1', NOW + 999).wait).toBe(1)
    expect(delays.begin('ann', '10.0.0.1', NOW + 1000).wait).toBe(0)
    expect(delays.begin('ann', '10.0.0.1', NOW + 1000).wait).toBe(2000)
    expect(delays.begin('ann', '10.0.0.1', NOW + 3000).wait).toBe(0)
    expect(delays.begin('ann', '10.0.0.1', NOW + 3000).wait).toBe(4000)
  })

  it('never has to wait longer than a minute, and a try that must wait does not lengthen it', () => {
    const delays = createSignInDelays()
    let now = NOW
    for (let n = 0; n < 20; n++) now += delays.begin('ann', '10.0.0.1', now).wait
    delays.begin('ann', '10.0.0.1', now)
    expect(delays.begin('ann', '10.0.0.1', now).wait).toBe(60_000)
    expect(delays.begin('ann', '10.0.0.1', now + 30_000).wait).toBe(30_000)
  })

  it('is forgotten after a quarter of an hour', () => {
    const delays = createSignInDelays()
    fail(delays, 5, 'ann', '10.0.0.1')
    expect(delays.begin('ann', '10.0.0.1', NOW + 900_000)).toEqual({ wait: 0, pause: 0 })
  })

  it('is forgotten once the right password came', () => {
    const delays = createSignInDelays()
    fail(delays, 5, 'ann', '10.0.0.1')
    delays.succeeded('ann', '10.0.0.1')
    expect(delays.begin('ann', '10.0.0.1', NOW).wait).toBe(0)
  })
})

describe('guessing from many addresses', () => {
  it('slows the answers for that person to five seconds but refuses nobody', () => {
    const delays = createSignInDelays()
    for (let n = 0; n < 10; n++) delays.begin('ann', `10.0.1.${n}`, NOW)
    expect(delays.begin('ann', '10.0.2.1', NOW)).toEqual({ wait: 0, pause: 250 })
    for (let n = 0; n < 30; n++) delays.begin('ann', `10.0.3.${n}`, NOW)
    expect(delays.begin('ann', '10.0.2.2', NOW)).toEqual({ wait: 0, pause: 5000 })
    expect(delays.begin('bob', '10.0.2.3', NOW)).toEqual({ wait: 0, pause: 0 })
  })
})

describe('guessing many people from one address', () => {
  it('has to wait after 25, and a good sign-in of one\'s own does not free the address', () => {
    const delays = createSignInDelays()
    for (let n = 0; n < 25; n++) delays.begin(`person${n}`, '10.0.0.1', NOW)
    expect(delays.begin('another', '10.0.0.1', NOW).wait).toBe(1000)
    expect(delays.begin('own', '10.0.0.1', NOW + 1000).wait).toBe(0)
    delays.succeeded('own', '10.0.0.1')
    expect(delays.begin('another', '10.0.0.1', NOW + 1000).wait).toBeGreaterThan(0)
  })
})

describe('the memory of failures', () => {
  it('is bounded: what failed longest ago goes first', () => {
    const delays = createSignInDelays(6)
    fail(delays, 5, 'ann', '10.0.0.1')
    expect(delays.begin('ann', '10.0.0.1', NOW).wait).toBe(1000)
    for (const n of [1, 2]) delays.begin(`person${n}`, `10.0.1.${n}`, NOW)
    expect(delays.begin('ann', '10.0.0.1', NOW).wait).toBe(0)
  })
})
