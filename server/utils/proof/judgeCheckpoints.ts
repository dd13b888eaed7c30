import type { StoredCheckpoint } from './checkpoints'
import type { DamageList } from './damageList'
import type { Sealing } from './sealing'
import { judgeSignature } from './signingKey'
import type { Recomputed } from './streamWalk'

/** The checkpoints by themselves: each signed by a key that is known, each naming the one before it. */
export function judgeChain(checkpoints: readonly StoredCheckpoint[], sealing: Sealing | null, damage: DamageList): void {
  let before: StoredCheckpoint | null = null
  for (const one of checkpoints) {
    const verdict = sealing ? judgeSignature(one.note, sealing.trusted) : 'good'
    const isOurs = one.says?.number === one.number && (!sealing || one.says.origin === sealing.origin)
    if (verdict === 'forged' || !isOurs) damage.add('checkpoint-forged', { checkpoint: one.number })
    else if (verdict === 'other-key') damage.add('checkpoint-other-key', { checkpoint: one.number })
    if (one.number !== (before?.number ?? 0) + 1) damage.add('checkpoint-missing', { checkpoint: (before?.number ?? 0) + 1 })
    else if (one.says && one.says.previous !== (before?.hash ?? '')) damage.add('checkpoint-missing', { checkpoint: one.number })
    before = one
  }
}

/** The checkpoints against the copies that were kept of them outside the database. */
export function judgeCopies(checkpoints: readonly StoredCheckpoint[], copies: readonly string[], damage: DamageList): void {
  const there = new Set(checkpoints.map(({ note }) => note))
  for (const note of copies) {
    if (there.has(note)) continue
    const number = /\nnumber (\d+)\n/.exec(note)?.[1]
    damage.add('checkpoint-missing', { checkpoint: number === undefined ? null : Number(number) })
  }
}

/** Each checkpoint against what the log now gives for it. */
export function judgeAgainstLog(checkpoints: readonly StoredCheckpoint[], recomputed: readonly Recomputed[], damage: DamageList): void {
  for (const [index, { number, says }] of checkpoints.entries()) {
    const now = recomputed[index]!
    if (!says) continue
    if (now.events < says.events) damage.add('fewer-than-checkpointed', { checkpoint: number })
    else if (now.root !== says.root || now.cylinders !== says.cylinders || now.events !== says.events) damage.add('not-as-checkpointed', { checkpoint: number })
  }
}
