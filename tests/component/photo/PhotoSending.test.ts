import { mountSuspended } from '@nuxt/test-utils/runtime'
import { beforeEach, describe, expect, it, vi } from 'vitest'
import PhotoSending from '~~/components/photo/PhotoSending.vue'

const bytes = new Uint8Array([0xFF])
const STILL = { waiting: 0, busy: false, unreached: false, unkept: false, refused: [] }

// The test's own Blob is none to the platform.
beforeEach(() => void vi.spyOn(URL, 'createObjectURL').mockReturnValue('blob:held'))

describe('photos on their way', () => {
  it('say nothing where there are none', async () => {
    expect((await mountSuspended(PhotoSending, { props: STILL })).text()).toBe('')
  })

  it('say that nothing waits for them, and without signal that they wait here', async () => {
    expect((await mountSuspended(PhotoSending, { props: { ...STILL, waiting: 2, busy: true } })).text()).toBe('Sending 2 photos. What was recorded does not wait for them.')
    const waits = await mountSuspended(PhotoSending, { props: { ...STILL, waiting: 1, unreached: true } })
    expect(waits.text()).toContain('1 photo waits on this device and goes when there is signal.')
    await waits.get('button').trigger('click')
    expect(waits.emitted('retry')).toHaveLength(1)
  })

  it('say why one was not taken, and let it be removed', async () => {
    const sending = await mountSuspended(PhotoSending, { props: { ...STILL, refused: [{ id: 'one', subject: 'damage' as const, refusal: 'The file is damaged.', bytes }] } })
    expect(sending.text()).toContain('Damage: not taken. The file is damaged.')
    await sending.findAll('button').find(button => button.text() === 'Remove')!.trigger('click')
    expect(sending.emitted('remove')).toEqual([['one']])
  })
})
