import { problem } from './problem'

/** A question that is understood and has no answer, with the field that has to be mended. */
export function impossible(path: string, message: string) {
  return problem(422, 'This cannot be worked out', 'Mend what is named.', [{ path, message }])
}
