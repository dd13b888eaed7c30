import { leafText } from '../../../utils/proof/checkpoint'
import { leafHash, merkleTree, type JoinedPairs, type MerkleTree } from '../../../utils/proof/merkle'
import { verifyStep } from '../../../utils/custody/chain'
import { sha256 } from '../custody/sha256'
import type { LogRow } from '../custody/logRow'
import type { StoredCheckpoint } from './checkpoints'
import type { DamageList } from './damageList'
import type { Head } from './heads'
import { sha256OfBytes } from './sha256OfBytes'

/** What the log gives for a checkpoint when it is walked through again. */
export interface Recomputed { root: string, cylinders: number, events: number }

/** A walk through the log, cylinder by cylinder in the order of their ids, line by line. */
export interface StreamWalk {
  /** A cylinder begins; `head` is where it is taken up, null at its first line. */
  begin: (head: Head | null) => void
  line: (row: LogRow) => void
  /** After the last line. */
  end: () => void
  lines: () => number
  cylinders: () => number
  /** In the order of the checkpoints. */
  recomputed: () => Recomputed[]
}

/**
 * Computes the chain of each cylinder again, and at the same time how the log stood at every checkpoint.
 *
 * A leaf is hashed once however many checkpoints it stands in, and trees of neighbours share what they have in common:
 * a year of daily checkpoints costs little more than one.
 *
 * @param checkpoints in the order of the numbers that they reach to.
 */
export function streamWalk(checkpoints: readonly StoredCheckpoint[], damage: DamageList): StreamWalk {
  const joined: JoinedPairs = []
  const reach = checkpoints.map(({ says }) => says?.seq ?? 0)
  const trees: MerkleTree[] = reach.map(() => merkleTree(sha256OfBytes, joined))
  // How many lines lie between a checkpoint and the one before it.
  const between = reach.map(() => 0)
  let lines = 0
  let cylinders = 0
  let last: Head | null = null
  // The first checkpoint that the cylinder's last line is not yet in.
  let at = 0

  function closeBefore(seq: number): void {
    let leaf: Uint8Array | null = null
    for (; at < reach.length && reach[at]! < seq; at++) {
      if (!last) continue
      leaf ??= leafHash(Buffer.from(leafText(last)), sha256OfBytes)
      trees[at]!.add(leaf)
    }
  }

  function end(): void {
    closeBefore(Infinity)
    last = null
  }

  return {
    begin(head) {
      end()
      cylinders++
      at = 0
      last = head
    },
    line(row) {
      if (last !== null && row.seq <= last.seq) damage.add('unlinked', { cylinderId: row.cylinder_id, version: row.version, seq: row.seq })
      const fault = verifyStep(row, { version: last?.version ?? 0, hash: last?.hash ?? '' }, sha256)
      if (fault) damage.add(fault, { cylinderId: row.cylinder_id, version: row.version, seq: row.seq })
      closeBefore(row.seq)
      if (at < reach.length) between[at] = between[at]! + 1
      lines++
      last = { cylinderId: row.cylinder_id, version: row.version, hash: row.hash, seq: row.seq }
    },
    end,
    lines: () => lines,
    cylinders: () => cylinders,
    recomputed() {
      let events = 0
      return trees.map((tree, index) => {
        events += between[index]!
        return { root: Buffer.from(tree.root()).toString('base64'), cylinders: tree.size(), events }
      })
    },
  }
}
