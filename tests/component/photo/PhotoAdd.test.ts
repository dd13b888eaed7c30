import { mountSuspended } from '@nuxt/test-utils/runtime'
import { beforeEach, describe, expect, it, vi } from 'vitest'
import PhotoAdd from '~~/components/photo/PhotoAdd.vue'

beforeEach(() => {
  vi.spyOn(URL, 'createObjectURL').mockReturnValue('blob:held')
  vi.spyOn(HTMLDialogElement.prototype, 'showModal').mockImplementation(function (this: HTMLDialogElement) {
    this.open = true
  })
})

const photo = (id: string) => ({ id, subject: 'damage' as const, bytes: new Uint8Array([0xFF]) })
const mount = (photos: ReturnType<typeof photo>[]) => mountSuspended(PhotoAdd, { props: { modelValue: true, line: 'line 12, weighed', photos, working: false, problem: null } })

describe('photos put to a line that is recorded', () => {
  it('are sent together, and the line stays', async () => {
    const add = await mount([photo('one'), photo('two')])
    expect(add.text()).toContain('The line stays as it was recorded.')
    await add.findAll('button').find(button => button.text() === 'Send 2 photos')!.trigger('click')
    expect(add.emitted('send')).toHaveLength(1)
  })

  it('are asked for where there are none', async () => {
    const add = await mount([])
    await add.findAll('button').find(button => button.text() === 'Send the photo')!.trigger('click')
    expect(add.emitted('send')).toBeUndefined()
    expect(add.text()).toContain('Take a photo first, or choose one.')
  })
})
