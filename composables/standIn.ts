/** How long an answer is waited for before something else may stand in for it. Units: milliseconds. Our choice. */
export const STANDS_IN_AFTER_MS = 3_000

/**
 * What stands in for an answer that is late; null once the answer is there, however it came out, and where nothing can
 * stand in for it.
 */
export async function standIn<T>(answer: Promise<unknown>, find: () => Promise<T | null>): Promise<T | null> {
  const come = answer.then(() => null, () => null)
  let timer: ReturnType<typeof setTimeout> | undefined
  const late = new Promise<T | null>((done) => {
    timer = setTimeout(() => done(find().then(found => found ?? come)), STANDS_IN_AFTER_MS)
  })
  try {
    return await Promise.race([come, late])
  }
  finally {
    clearTimeout(timer)
  }
}
