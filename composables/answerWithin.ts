/**
 * An answer that comes whole within a time. A network that brings its head and never its end is given up too, which the
 * time limit of `$fetch` does not: that ends with the head.
 *
 * Errors: those of `ask`; where the time is over, one that counts as not reached.
 */
export async function answerWithin<T>(ms: number, ask: (signal: AbortSignal) => Promise<T>): Promise<T> {
  const over = new AbortController()
  const timer = setTimeout(() => over.abort(), ms)
  try {
    return await ask(over.signal)
  }
  finally {
    clearTimeout(timer)
  }
}
