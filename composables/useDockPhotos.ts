import { NotAPhoto, shrinkPhoto } from '~~/composables/shrinkPhoto'
import { MOST_ENTRY_PHOTOS } from '~~/utils/dock/entry'

/** Photos that are taken for one entry, until it is kept. */
export function useDockPhotos() {
  const photos = shallowRef<{ id: string, bytes: Uint8Array<ArrayBuffer> }[]>([])
  const working = ref(false)
  const problem = ref<string | null>(null)
  let taken = 0

  async function add(files: File[]) {
    working.value = true
    problem.value = null
    try {
      for (const file of files.slice(0, MOST_ENTRY_PHOTOS - photos.value.length)) {
        photos.value = [...photos.value, { id: `photo ${++taken}`, bytes: await shrinkPhoto(file) }]
      }
    }
    catch (error) {
      if (!(error instanceof NotAPhoto)) throw error
      problem.value = error.message
    }
    finally {
      working.value = false
    }
  }

  function remove(id: string) {
    photos.value = photos.value.filter(photo => photo.id !== id)
  }

  function clear() {
    photos.value = []
    problem.value = null
  }

  return { photos, working, problem, add, remove, clear }
}
