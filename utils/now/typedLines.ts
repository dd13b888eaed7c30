import type { NowLine } from '../contract/now'
import { isFormKind } from '../custody/draft/formKinds'
import { KIND_WORDS } from '../custody/words'

const UUID = /^[0-9a-f]{8}(-[0-9a-f]{4}){3}-[0-9a-f]{12}$/

/**
 * A line for each form that a person began on this device and did not record.
 *
 * Shape: forms go by the names under which they are kept, such as '<cylinder> weighed' or 'settlement <shipment>'; what
 * is kept under another name is no form, or cannot be opened again by an address.
 */
export function typedLines(names: readonly string[]): NowLine[] {
  return [...names].sort().flatMap((name) => {
    const [first = '', second = '', third = ''] = name.split(' ')
    if (name === 'registration') return typed(name, 'a registration', '/fleet/register')
    if (first === 'settlement' && UUID.test(second)) return typed(name, 'the figures of a settlement', `/shipments/${second}/settlement`)
    if (first === 'return' && UUID.test(second)) return typed(name, 'the results of a test lot', `/retests/${second}`)
    if (first === 'batch' && /^[a-z]+$/.test(second)) return typed(name, 'a list of scanned cylinders', `/batch?act=${second}${UUID.test(third) ? `&van=${third}` : ''}`)
    if (first === 'batch' && second === 'check-in' && UUID.test(third)) return typed(name, 'the check-in of a van', `/vans/${third}/check-in`)
    if (UUID.test(first) && second === 'recovery') return typed(name, 'a recovery beside the scale', `/c/${first}/recover`)
    return UUID.test(first) && isFormKind(second) ? typed(name, KIND_WORDS[second].done.toLowerCase(), `/c/${first}/act/${second}`) : []
  })
}

function typed(name: string, what: string, to: string): NowLine[] {
  return [{
    key: `typed ${name}`, topic: 'typed', kind: 'att', number: 1, to, verb: 'Go on with it',
    sentence: `Typed and not recorded: ${what}.`, reason: 'It is kept on this device alone.',
  }]
}
