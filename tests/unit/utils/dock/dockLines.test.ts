import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { dockLines, unexpectedCylinders } from '../../../../utils/dock/dockLines'
import { DOCK_KINDS, type DockKind, type DockSaid, type LinkedDockEntry } from '../../../../utils/dock/entry'

const [A, B] = ['cylinder-a', 'cylinder-b']

/** An entry made so many minutes after eight in the morning. */
function entry<Kind extends DockKind>(id: string, kind: Kind, minute: number, said: DockSaid[Kind], linkId = 'link-1'): LinkedDockEntry {
  const at = new Date(Date.UTC(2026, 10, 30, 8, minute)).toISOString()
  return { id, kind, name: 'Dana at dock 2', at, said, linkId } as LinkedDockEntry
}

const lb = (value: number) => ({ unit: 'lb' as const, value })

describe('what the dock says of a cylinder', () => {
  it('is nothing where nobody has said anything of it', () => {
    expect(dockLines([entry('1', 'here', 0, { cylinderId: A })]).has(B)).toBe(false)
  })

  it('has it there once it is ticked, weighed, graded or found damaged', () => {
    const lines = dockLines([
      entry('1', 'gross', 0, { cylinderId: A, gross: lb(52.4) }),
      entry('2', 'damaged', 1, { cylinderId: B, what: 'dented collar', photoIds: ['photo-1'] }),
    ])
    expect(lines.get(A)).toMatchObject({ here: true, missing: false, theirGross: lb(52.4), firstGross: null, damage: null })
    expect(lines.get(B)).toMatchObject({ here: true, theirGross: null, damage: 'dented collar', photoIds: ['photo-1'] })
  })

  it('takes a missing one as there once it is found, and one that was ticked by mistake as missing', () => {
    const missing = entry('1', 'missing', 0, { cylinderId: A })
    expect(dockLines([missing]).get(A)).toMatchObject({ here: false, missing: true })
    expect(dockLines([missing, entry('2', 'here', 5, { cylinderId: A })]).get(A)).toMatchObject({ here: true, missing: false })
    expect(dockLines([entry('0', 'here', -5, { cylinderId: A }), missing]).get(A)).toMatchObject({ here: false, missing: true })
  })

  it('keeps the later of two weights, and that another was read first', () => {
    const lines = dockLines([
      entry('1', 'gross', 0, { cylinderId: A, gross: lb(52.4) }),
      entry('2', 'gross', 3, { cylinderId: A, gross: lb(50.4) }),
    ])
    expect(lines.get(A)).toMatchObject({ theirGross: lb(50.4), firstGross: lb(52.4) })
  })

  it('still tells the first weight where it was taken out before another was entered', () => {
    const lines = dockLines([
      entry('1', 'gross', 0, { cylinderId: A, gross: lb(1) }),
      entry('2', 'taken-out', 1, { entryId: '1' }),
      entry('3', 'gross', 2, { cylinderId: A, gross: lb(50.4) }),
    ])
    expect(lines.get(A)).toMatchObject({ theirGross: lb(50.4), firstGross: lb(1) })
  })

  it('adds a grade and an accepted net that come apart', () => {
    const lines = dockLines([
      entry('1', 'graded', 0, { cylinderId: A, grade: 'clean', acceptedNet: null }),
      entry('2', 'graded', 60, { cylinderId: A, grade: null, acceptedNet: lb(24.1) }),
      entry('3', 'sent-back', 90, { cylinderId: A, because: null }),
    ])
    expect(lines.get(A)).toMatchObject({ grade: 'clean', acceptedNet: lb(24.1), sentBack: { because: null }, at: '2026-11-30T09:30:00.000Z' })
  })

  it('lets nobody take out what came over another link', () => {
    const theirs = entry('1', 'overdue', 0, { cylinderId: A }, 'link-1')
    expect(dockLines([theirs, entry('2', 'taken-out', 1, { entryId: '1' }, 'link-2')]).get(A)?.overdue).toBe(true)
    expect(dockLines([theirs, entry('2', 'taken-out', 1, { entryId: '1' }, 'link-1')]).has(A)).toBe(false)
  })
})

describe('a cylinder that was not expected', () => {
  it('is told with its serial until it is taken out', () => {
    const told = entry('1', 'unexpected', 0, { serial: 'T-4471', what: null, photoIds: [] })
    expect(unexpectedCylinders([told])).toEqual([
      { entryId: '1', serial: 'T-4471', what: null, photoIds: [], by: 'Dana at dock 2', at: '2026-11-30T08:00:00.000Z' },
    ])
    expect(unexpectedCylinders([told, entry('2', 'taken-out', 4, { entryId: '1' })])).toEqual([])
  })
})

const anyEntry = fc.record({
  kind: fc.constantFrom(...DOCK_KINDS), number: fc.integer({ min: 0, max: 9 }), minute: fc.integer({ min: 0, max: 5 }),
  cylinderId: fc.constantFrom(A, B), linkId: fc.constantFrom('link-1', 'link-2'), value: fc.integer({ min: 1, max: 90 }),
}).map(({ kind, number, minute, cylinderId, linkId, value }) => {
  const said = {
    'here': { cylinderId }, 'overdue': { cylinderId }, 'missing': { cylinderId },
    'gross': { cylinderId, gross: lb(value) },
    'damaged': { cylinderId, what: `mark ${value}`, photoIds: [`photo-${value}`] },
    'unexpected': { serial: `S-${value}`, what: null, photoIds: [] },
    'graded': { cylinderId, grade: `grade ${value}`, acceptedNet: null },
    'sent-back': { cylinderId, because: null },
    'taken-out': { entryId: `${(number + 1) % 10}` },
  }[kind]
  return entry(`${number}`, kind, minute, said as DockSaid[typeof kind], linkId)
})
const anyEntries = fc.uniqueArray(anyEntry, { selector: ({ id }) => id, maxLength: 10 })

describe('entries that arrive in any order', () => {
  it('come to the same, however often each arrives', () => {
    const arrivals = anyEntries.chain(entries => fc.tuple(fc.constant(entries), fc.shuffledSubarray(entries, { minLength: entries.length })))
    fc.assert(fc.property(arrivals, ([entries, shuffled]) => {
      const twice = [...shuffled, ...entries]
      expect(sorted(dockLines(twice))).toEqual(sorted(dockLines(entries)))
      expect(unexpectedCylinders(twice)).toEqual(unexpectedCylinders(entries))
    }))
  })
})

function sorted(lines: ReturnType<typeof dockLines>) {
  return [...lines].sort(([a], [b]) => a.localeCompare(b))
}
