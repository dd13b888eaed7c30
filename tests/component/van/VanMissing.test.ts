import { mountSuspended } from '@nuxt/test-utils/runtime'
import { describe, expect, it } from 'vitest'
import VanMissing from '~~/components/van/VanMissing.vue'
import type { CylinderRow } from '~~/utils/custody/cylinderView'
import { cylinderRow } from '../../helpers/cylinderRow'

const NOW = Date.parse('2026-12-01T18:00:00Z')

async function shown(missing: CylinderRow[], expected = 3) {
  const { element } = await mountSuspended(VanMissing, { props: { missing, expected, timeZone: 'America/Chicago', now: NOW } })
  return element.textContent!
}

describe('what did not come back', () => {
  it('is named with who held it last and when it was seen', async () => {
    const said = await shown([cylinderRow({ holder: { id: 'p', name: 'Ida Holt' } })])
    expect(said).toContain('Expected 3: 2 scanned, 1 missing')
    expect(said).toContain('7K3 M9Q 2TX')
    expect(said).toContain('last held by Ida Holt')
    expect(said).toMatch(/last seen .*: filled/)
  })

  it('is never said to be held by somebody where nobody is known, nor seen where it was not', async () => {
    const said = await shown([cylinderRow({ holder: null, labelCode: null, lastEventAt: null, lastEventKind: null })])
    expect(said).toContain('SN K48213')
    expect(said).toContain('held by nobody')
    expect(said).toContain('never seen')
  })

  it('is nothing where all came back', async () => {
    expect(await shown([])).toContain('Nothing is missing.')
  })
})
