import { afterAll, vi } from 'vitest'

/*
 * What a page put off (the copy two seconds after it stands, a look every minute) must not wake when its test file is over:
 * the modules that it fetches then are gone. So no timer outlives the file, and what is being fetched arrives before it ends.
 */

/** Rounds in which whatever still comes in may ask for something more. */
const ROUNDS = 5

const putOff = new Set<ReturnType<typeof setTimeout>>()
let isOver = false

globalThis.setTimeout = remembering(globalThis.setTimeout)
globalThis.setInterval = remembering(globalThis.setInterval)

function remembering<Start extends typeof setTimeout | typeof setInterval>(start: Start): Start {
  const put = (...how: Parameters<typeof setTimeout>) => {
    const timer = start(...how)
    if (isOver) clearTimeout(timer)
    else putOff.add(timer)
    return timer
  }
  return Object.defineProperties(put, Object.getOwnPropertyDescriptors(start)) as Start
}

afterAll(async () => {
  isOver = true
  for (const timer of putOff) clearTimeout(timer)
  for (let round = 0; round < ROUNDS; round++) {
    await new Promise(done => setImmediate(done))
    await vi.dynamicImportSettled()
  }
})
