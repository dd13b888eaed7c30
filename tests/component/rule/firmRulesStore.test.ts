import { registerEndpoint } from '@nuxt/test-utils/runtime'
import { createError } from 'h3'
import { createPinia, setActivePinia } from 'pinia'
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest'
import { useFirmRulesStore } from '~~/stores/firmRules'

let asked = 0
let share = 800
let isDown = false
registerEndpoint('/api/policy', () => {
  asked++
  if (isDown) throw createError({ statusCode: 503 })
  return { timeZone: 'America/Chicago', fillPolicy: { shareThousandths: share } }
})

const START = Date.UTC(2026, 11, 1, 15)
const at = (seconds: number) => vi.spyOn(Date, 'now').mockReturnValue(START + seconds * 1000)
const shareNow = async () => (await useFirmRulesStore().load()).fillPolicy.shareThousandths

describe('the firm\'s rules as a screen knows them', () => {
  beforeEach(() => {
    setActivePinia(createPinia())
    asked = 0
    share = 800
    isDown = false
  })
  afterEach(() => vi.restoreAllMocks())

  it('are asked for once a minute, so that a rule set meanwhile is known by then', async () => {
    at(0)
    expect(await shareNow()).toBe(800)
    share = 700
    at(59)
    expect(await shareNow()).toBe(800)
    at(60)
    expect(await shareNow()).toBe(700)
    expect(asked).toBe(2)
  })

  it('are asked for once by those who ask together', async () => {
    at(0)
    await Promise.all([shareNow(), shareNow(), shareNow()])
    expect(asked).toBe(1)
  })

  it('count on as last told while there is no connection', async () => {
    at(0)
    await shareNow()
    isDown = true
    at(3600)
    expect(await shareNow()).toBe(800)
  })

  it('are not known where they were never told', async () => {
    isDown = true
    at(0)
    await expect(shareNow()).rejects.toMatchObject({ statusCode: 503 })
  })
})
