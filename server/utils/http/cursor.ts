import { problem } from './problem'

/** The refusal of a cursor that none of our answers gave: going on from the beginning would show the same page for ever. */
export function foreignCursor() {
  return problem(400, 'Malformed', 'The query does not fit.', [{ path: 'cursor', message: 'is none of ours' }])
}
