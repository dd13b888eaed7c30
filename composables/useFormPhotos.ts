import { NotAPhoto, shrinkPhoto } from '~~/composables/shrinkPhoto'
import { usePhotosStore } from '~~/stores/photos'
import type { PhotoSubject } from '~~/utils/photo/subject'

/**
 * The photos of a form: kept on the device until it is recorded, then sent by themselves.
 *
 * Shape: `key` names the form, as {@link useKept} has it; `subject` is what its photos are of unless it is said.
 */
export function useFormPhotos(key: MaybeRefOrGetter<string>, subject: MaybeRefOrGetter<PhotoSubject>) {
  const store = usePhotosStore()
  const working = ref(false)
  const problem = ref<string | null>(null)
  const form = () => toValue(key)
  const photos = computed(() => store.ofForm(form()))
  const ids = computed(() => photos.value.map(({ id }) => id))

  onMounted(() => void store.load())

  async function add(files: File[]) {
    working.value = true
    problem.value = null
    try {
      for (const file of files) await store.take(form(), await shrinkPhoto(file), toValue(subject))
    }
    catch (error) {
      if (!(error instanceof NotAPhoto)) throw error
      problem.value = error.message
    }
    finally {
      working.value = false
    }
  }

  async function change(id: string, next: PhotoSubject) {
    const photo = photos.value.find(each => each.id === id)
    if (photo) await store.keep({ ...photo, subject: next })
  }

  return {
    photos, ids, working, problem, add, change,
    remove: (id: string) => store.remove(id),
    /** To be called once the form is recorded. */
    release: (eventId: string | null = null) => store.release(form(), eventId),
    drop: () => store.drop(form()),
  }
}
