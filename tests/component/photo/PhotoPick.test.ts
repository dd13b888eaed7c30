import { mountSuspended } from '@nuxt/test-utils/runtime'
import { beforeEach, describe, expect, it, vi } from 'vitest'
import PhotoPick from '~~/components/photo/PhotoPick.vue'

const bytes = new Uint8Array([0xFF, 0xD8, 0xFF])
const PHOTOS = [{ id: 'one', subject: 'scale' as const, bytes }, { id: 'two', subject: 'stamp' as const, bytes }]
const mount = (props: Partial<{ photos: typeof PHOTOS, working: boolean, problem: string | null }> = {}) =>
  mountSuspended(PhotoPick, { props: { photos: PHOTOS, working: false, problem: null, ...props } })

// The test's own Blob is none to the platform.
beforeEach(() => void vi.spyOn(URL, 'createObjectURL').mockReturnValue('blob:held'))

describe('the photos of a form', () => {
  it('are taken by the camera that looks away, or chosen, several at once', async () => {
    const [take, choose] = (await mount()).findAll('input[type="file"]')
    expect([take!.attributes('accept'), take!.attributes('capture')]).toEqual(['image/*', 'environment'])
    expect([choose!.attributes('capture'), choose!.attributes('multiple')]).toEqual([undefined, ''])
  })

  it('are handed on as soon as they are chosen', async () => {
    const pick = await mount()
    const input = pick.findAll<HTMLInputElement>('input[type="file"]')[1]!
    const file = new File([bytes], 'a.jpg', { type: 'image/jpeg' })
    Object.defineProperty(input.element, 'files', { value: [file], configurable: true })
    await input.trigger('change')
    expect(pick.emitted('add')).toEqual([[[file]]])
  })

  it('say what each shows, and are removed one by one', async () => {
    const pick = await mount()
    expect(pick.findAll('select').map(select => (select.element as HTMLSelectElement).value)).toEqual(['scale', 'stamp'])
    await pick.get('select[aria-label="What photo 2 shows"]').setValue('damage')
    await pick.get('button[aria-label="Remove photo 1"]').trigger('click')
    expect(pick.emitted('change')).toEqual([['two', 'damage']])
    expect(pick.emitted('remove')).toEqual([['one']])
  })

  it('say why one was not taken', async () => {
    expect((await mount({ problem: 'This picture is HEIC.' })).text()).toContain('This picture is HEIC.')
  })
})
