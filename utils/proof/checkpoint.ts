/** What a checkpoint says of the custody log. */
export interface Checkpoint {
  /** Which log: the same in every checkpoint of a firm. */
  origin: string
  /** Counts up from 1. */
  number: number
  /** UTC milliseconds. */
  at: number
  /** The last number of the log, and how many events it holds up to there. */
  seq: number
  events: number
  cylinders: number
  /** Base64 of the Merkle root over the heads of all cylinders. */
  root: string
  /** Of the note before it, SHA-256 in hexadecimal; '' for the first. */
  previous: string
}

/** How a cylinder's log ends: its last version and that line's hash. */
export interface StreamHead { cylinderId: string, version: number, hash: string }

/** The leaf of a cylinder in the tree of a checkpoint, where cylinders stand in the order of their ids. */
export function leafText({ cylinderId, version, hash }: StreamHead): string {
  return JSON.stringify([cylinderId, version, hash])
}

/** The name of a firm's log, which is also the name of the key that signs its checkpoints. */
export function originOf(firmId: string): string {
  return `custody-log/${firmId}`
}

const FIRST = 'none'
const BODY = new RegExp([
  '^(?<origin>[^\\s+]+)',
  '(?<cylinders>0|[1-9]\\d*)',
  '(?<root>[A-Za-z0-9+/]{43}=)',
  'number (?<number>[1-9]\\d*)',
  'events (?<events>0|[1-9]\\d*)',
  'seq (?<seq>0|[1-9]\\d*)',
  'at (?<at>\\d{4}-\\d\\d-\\d\\dT\\d\\d:\\d\\d:\\d\\d\\.\\d{3}Z)',
  'previous (?<previous>none|[0-9a-f]{64})',
  '$',
].join('\\n'))

/**
 * The text that is signed.
 *
 * Form: the first three lines as C2SP tlog-checkpoint has them (origin, size of the tree, root), then lines of our own.
 * The leaves are the heads of the cylinders and change as these do: one checkpoint follows another by naming it, not by
 * a proof that the tree only grew.
 */
export function checkpointText(checkpoint: Checkpoint): string {
  return [
    checkpoint.origin, checkpoint.cylinders, checkpoint.root,
    `number ${checkpoint.number}`, `events ${checkpoint.events}`, `seq ${checkpoint.seq}`,
    `at ${new Date(checkpoint.at).toISOString()}`, `previous ${checkpoint.previous || FIRST}`, '',
  ].join('\n')
}

/** A checkpoint from its text; null where it is none. */
export function readCheckpoint(text: string): Checkpoint | null {
  const parts = BODY.exec(text)?.groups
  if (!parts) return null
  const at = Date.parse(parts.at!)
  if (!Number.isFinite(at)) return null
  return {
    origin: parts.origin!,
    number: Number(parts.number),
    at,
    seq: Number(parts.seq),
    events: Number(parts.events),
    cylinders: Number(parts.cylinders),
    root: parts.root!,
    previous: parts.previous === FIRST ? '' : parts.previous!,
  }
}
