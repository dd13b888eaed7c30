import { problem } from '../http/problem'

/** Errors: 409 where something else was kept under an id than what is sent now; its sender would believe it stored. */
export function refuseOther(what: string, kept: object | undefined, sent: object): void {
  if (JSON.stringify(kept) !== JSON.stringify(sent)) throw problem(409, `${what} with this id says something else`, 'Send it again under a new id.')
}
