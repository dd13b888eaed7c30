/**
 * The four statuses a screen can show, each with a shape, a word and a colour of its own: may be used, needs attention,
 * stop, not known.
 */
export type StatusKind = 'ok' | 'att' | 'stop' | 'unk'

const TEXT_COLOUR: Record<StatusKind, string> = {
  ok: 'text-okT', att: 'text-attT', stop: 'text-stopT', unk: 'text-unkT',
}

/** Gives the class that sets text in the colour of a status. */
export function statusText(kind: StatusKind): string {
  return TEXT_COLOUR[kind]
}
