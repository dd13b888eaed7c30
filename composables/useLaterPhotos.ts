import { useFormPhotos } from '~~/composables/useFormPhotos'
import { usePhotosStore } from '~~/stores/photos'
import { useSessionStore } from '~~/stores/session'
import { can } from '~~/utils/access/permissions'
import type { LogLine } from '~~/utils/contract/custody'
import { usualSubject } from '~~/utils/picture/usualSubject'

/** Photos put to a line of the log that is recorded: by its author and by managers. */
export function useLaterPhotos() {
  const session = useSessionStore()
  const store = usePhotosStore()
  /** The line that photos are being put to. */
  const line = shallowRef<LogLine | null>(null)
  const photos = useFormPhotos(() => `later ${line.value?.id ?? ''}`, () => line.value ? usualSubject(line.value.kind) : 'other')

  const open = computed({
    get: () => line.value !== null,
    set: (next: boolean) => {
      if (!next) line.value = null
    },
  })

  /** A signature and a correction saw nothing that could be shown. */
  function mayAdd({ author, kind }: LogLine): boolean {
    return kind !== 'countersigned' && kind !== 'corrected' && session.mayI('events:post') && (author.id === session.user?.id || can(session.access, 'events:correct-any'))
  }

  async function send() {
    const to = line.value
    if (!to) return
    await photos.release(to.id)
    line.value = null
  }

  return { line, open, photos, store, mayAdd, send }
}
