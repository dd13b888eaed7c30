/** SHA-256 of some bytes, given in parts. */
export type Sha256OfBytes = (...parts: Uint8Array[]) => Uint8Array

/** A Merkle tree to which leaves are added from left to right. */
export interface MerkleTree {
  /** How many leaves it has. */
  size: () => number
  /** Adds the hash of a leaf: {@link leafHash}. */
  add: (leaf: Uint8Array) => void
  root: () => Uint8Array
}

/** The last pair that was joined at each height. Trees that grow alike and share it join each pair once. */
export type JoinedPairs = { left: Uint8Array, right: Uint8Array, node: Uint8Array }[]

// RFC 6962, section 2.1: what is hashed begins with 0 for a leaf and with 1 for a node.
const LEAF = Uint8Array.of(0)
const NODE = Uint8Array.of(1)

/** The hash of a leaf. Source: RFC 6962, section 2.1. */
export function leafHash(data: Uint8Array, sha256: Sha256OfBytes): Uint8Array {
  return sha256(LEAF, data)
}

/**
 * A Merkle tree that keeps only the roots of its full subtrees, so that a tree of any size costs some kilobytes.
 *
 * Source: RFC 6962, section 2.1; the root of no leaves is the hash of nothing.
 */
export function merkleTree(sha256: Sha256OfBytes, joined: JoinedPairs = []): MerkleTree {
  // The root of the full subtree of 2^height leaves, where the tree has one at its right end.
  const full: (Uint8Array | null)[] = []
  let size = 0

  function join(left: Uint8Array, right: Uint8Array, height: number): Uint8Array {
    const last = joined[height]
    if (last !== undefined && last.left === left && last.right === right) return last.node
    const node = sha256(NODE, left, right)
    joined[height] = { left, right, node }
    return node
  }

  return {
    size: () => size,
    add(leaf) {
      let carried = leaf
      let height = 0
      for (; full[height]; height++) {
        carried = join(full[height]!, carried, height)
        full[height] = null
      }
      full[height] = carried
      size++
    },
    root() {
      let right: Uint8Array | null = null
      for (const left of full) {
        if (left) right = right === null ? left : sha256(NODE, left, right)
      }
      return right ?? sha256()
    },
  }
}
