import { expect, it } from 'vitest'
import type { CustodyEvent } from '../../../../utils/custody/event'
import type { EventKind } from '../../../../utils/custody/kinds'
import { newEntry, savedTogether } from '../../../../utils/outbox/entry'

const entry = (id: string, kind: EventKind, cylinderId: string, queuedAt = 1) => newEntry({ id, kind, cylinderId } as CustodyEvent, 'tina', queuedAt)

const REGISTRATION = entry('r', 'registered', 'c1')
const OUT = entry('o', 'transferred', 'c1', 2)
const SCAN = entry('s', 'moved', 'c1', 3)
const ALL = [REGISTRATION, entry('l', 'labelled', 'c1'), OUT, entry('i', 'transferred', 'c2', 2), SCAN, entry('t', 'moved', 'c2', 3), entry('w', 'weighed', 'c1', 4)]

it.each([
  ['a registration with its label', REGISTRATION, 'rl'],
  ['a transfer with its other half', OUT, 'oi'],
  ['a scan of a batch alone', SCAN, 's'],
])('takes back %s, and nothing that was saved later', (_what, taken, ids) => {
  expect(savedTogether(ALL, taken).map(({ id }) => id).join('')).toBe(ids)
})
