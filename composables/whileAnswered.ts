/**
 * Follows work that answers step by step, as long as each answer comes within a time; afterwards `heard` is called no more
 * and the work goes on by itself. Gives whether it came to its end.
 */
export async function whileAnswered<Step>(
  ms: number, work: (told: (step: Step) => void) => Promise<unknown>, heard: (step: Step) => void,
): Promise<boolean> {
  let timer: ReturnType<typeof setTimeout> | undefined
  let isOver = false
  try {
    return await new Promise<boolean>((done, failed) => {
      const wait = () => {
        clearTimeout(timer)
        timer = setTimeout(() => {
          isOver = true
          done(false)
        }, ms)
      }
      wait()
      work((step) => {
        if (isOver) return
        heard(step)
        wait()
      }).then(() => done(true), failed)
    })
  }
  finally {
    isOver = true
    clearTimeout(timer)
  }
}
