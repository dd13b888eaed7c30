/**
 * The statuses a screen can show, each with a shape, a word and a colour of its own: may be used, needs attention,
 * stop, not known; and away, for what is known to be in another's hands, so that nothing is to be done with it here.
 */
export type StatusKind = 'ok' | 'att' | 'stop' | 'unk' | 'away'

const TEXT_COLOUR: Record<StatusKind, string> = {
  ok: 'text-okT', att: 'text-attT', stop: 'text-stopT', unk: 'text-unkT', away: 'text-muted',
}

/** Gives the class that sets text in the colour of a status. */
export function statusText(kind: StatusKind): string {
  return TEXT_COLOUR[kind]
}
