/** Whether faults run in their full number (`npm run faults`). */
export const IN_FULL = process.env.FAULTS_FULL === '1'

/** The seeds of a run: those asked for by `FAULTS_SEED=7` or `FAULTS_SEED=7,8`, else 1 to so many. */
export function seeds(count: number): number[] {
  const asked = process.env.FAULTS_SEED
  return asked ? asked.split(',').map(Number) : Array.from({ length: count }, (_, index) => index + 1)
}
