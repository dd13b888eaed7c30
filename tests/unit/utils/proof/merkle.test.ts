import { createHash } from 'node:crypto'
import { describe, expect, it } from 'vitest'
import { leafHash, merkleTree, type JoinedPairs } from '../../../../utils/proof/merkle'

function sha256(...parts: Uint8Array[]): Uint8Array {
  const hash = createHash('sha256')
  for (const part of parts) hash.update(part)
  return hash.digest()
}

// Inputs and roots of the reference implementation of Certificate Transparency (RFC 6962), as its successor publishes them:
// github.com/transparency-dev/merkle, testonly/constants.go.
const INPUTS = ['', '00', '10', '2021', '3031', '40414243', '5051525354555657', '606162636465666768696a6b6c6d6e6f']
const ROOTS = [
  'e3b0c44298fc1c149afbf4c8996fb92427ae41e4649b934ca495991b7852b855',
  '6e340b9cffb37a989ca544e6bb780a2c78901d3fb33738768511a30617afa01d',
  'fac54203e7cc696cf0dfcb42c92a1d9dbaf70ad9e621f4bd8d98662f00e3c125',
  'aeb6bcfe274b70a14fb067a5e5578264db0fa9b51af5e0ba159158f329e06e77',
  'd37ee418976dd95753c1c73862b9398fa2a2cf9b4ff0fdfe8b30cd95209614b7',
  '4e3bbb1f7b478dcfe71fb631631519a3bca12c9aefca1612bfce4c13a86264d4',
  '76e67dadbcdf1e10e1b74ddc608abd2f98dfb16fbce75277b5232a127f2087ef',
  'ddb89be403809e325750d3d263cd78929c2942b7942a34b77e122c9594a74c8c',
  '5dc9da79a70659a9ad559cb701ded9a2ab9d823aad2f4960cfe370eff4604328',
]

function leaf(hex: string): Uint8Array {
  return leafHash(Buffer.from(hex, 'hex'), sha256)
}

function hexOf(bytes: Uint8Array): string {
  return Buffer.from(bytes).toString('hex')
}

describe('the Merkle root', () => {
  it('is the published one for each number of leaves from none to eight', () => {
    const tree = merkleTree(sha256)
    expect(hexOf(tree.root())).toBe(ROOTS[0])
    for (const [index, input] of INPUTS.entries()) {
      tree.add(leaf(input))
      expect(tree.size()).toBe(index + 1)
      expect(hexOf(tree.root())).toBe(ROOTS[index + 1])
    }
  })

  it('is the same for trees that grow side by side and share what they joined', () => {
    const joined: JoinedPairs = []
    const [whole, other] = [merkleTree(sha256, joined), merkleTree(sha256, joined)]
    const leaves = INPUTS.map(leaf)
    for (const [index, one] of leaves.entries()) {
      whole.add(one)
      if (index !== 2) other.add(one)
    }
    const apart = merkleTree(sha256)
    for (const [index, one] of leaves.entries()) if (index !== 2) apart.add(one)
    expect(hexOf(whole.root())).toBe(ROOTS[8])
    expect(hexOf(other.root())).toBe(hexOf(apart.root()))
  })

  it('costs each pair once where two trees have the same leaves', () => {
    let hashed = 0
    const counting = (...parts: Uint8Array[]) => {
      hashed++
      return sha256(...parts)
    }
    const joined: JoinedPairs = []
    const trees = [merkleTree(counting, joined), merkleTree(counting, joined)]
    for (const input of INPUTS) {
      const one = leaf(input)
      for (const tree of trees) tree.add(one)
    }
    // Eight leaves are joined by seven nodes.
    expect(hashed).toBe(7)
  })
})
