import { mountSuspended } from '@nuxt/test-utils/runtime'
import { flushPromises } from '@vue/test-utils'
import { describe, expect, it, vi } from 'vitest'
import PhotoStrip from '~~/components/photo/PhotoStrip.vue'
import PhotoView from '~~/components/photo/PhotoView.vue'
import type { Photo } from '~~/utils/contract/uploads'

const photo = (id: string, changes: Partial<Photo> = {}): Photo => ({
  id, subject: 'stamp', takenAt: '2026-05-14T14:00:00.000Z', arrivedAt: '2026-05-14T16:30:00.000Z', by: { id: 'p', name: 'Tina' }, putAt: null,
  width: 1200, height: 900, contentHash: 'a'.repeat(64), ...changes,
})
const AROUND = { timeZone: 'America/Chicago', nowMs: Date.parse('2026-07-01T12:00:00Z') }

describe('photos beside a line', () => {
  it('are small pictures that say in words what they are', async () => {
    const strip = await mountSuspended(PhotoStrip, { props: { photos: [photo('one')], onTheWay: 0, ...AROUND } })
    const image = strip.get('button img')
    expect(image.attributes('src')).toBe('/api/uploads/one?size=thumb')
    expect(image.attributes('alt')).toBe('Photo of the stamp, 14 May 2026, by Tina')
    expect(strip.text()).not.toContain('on its way')
  })

  it('are said to be on their way until they have come', async () => {
    const text = async (onTheWay: number) => (await mountSuspended(PhotoStrip, { props: { photos: [], onTheWay, ...AROUND } })).text()
    expect(await text(1)).toBe('Photo on its way')
    expect(await text(3)).toBe('3 photos on their way')
  })
})

describe('a photo in its full size', () => {
  const mount = async (photos: Photo[], at = 0) => {
    vi.spyOn(HTMLDialogElement.prototype, 'showModal').mockImplementation(function (this: HTMLDialogElement) {
      this.open = true
    })
    return mountSuspended(PhotoView, { props: { 'photos': photos, ...AROUND, 'modelValue': at, 'onUpdate:modelValue': () => undefined } })
  }

  it('says when it was taken, when it came, and that it was put to the line later', async () => {
    const view = await mount([photo('one', { putAt: '2026-05-15T13:00:00.000Z' })])
    expect(view.get('img').attributes()).toMatchObject({ src: '/api/uploads/one', alt: 'Photo of the stamp, 14 May 2026, by Tina' })
    expect(view.text()).toContain('Taken 14 May 09:00 by the phone\'s clock, arrived 14 May 11:30, put to this line 15 May 08:00, after it was recorded')
  })

  it('goes on and back by the arrow keys, and not beyond the ends', async () => {
    const view = await mount([photo('one'), photo('two')], 0)
    await view.get('dialog').trigger('keydown', { key: 'ArrowLeft' })
    await view.get('dialog').trigger('keydown', { key: 'ArrowRight' })
    expect(view.emitted('update:modelValue')).toEqual([[1]])
  })

  it('is closed by Esc and by its button', async () => {
    const view = await mount([photo('one')])
    await view.get('dialog').trigger('close')
    expect(view.emitted('update:modelValue')).toEqual([[null]])
  })

  it('says so where it cannot be shown', async () => {
    const view = await mount([photo('one')])
    await view.get('img').trigger('error')
    await flushPromises()
    expect(view.text()).toContain('The photo cannot be shown just now.')
  })
})
