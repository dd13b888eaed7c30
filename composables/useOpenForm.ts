import { v7 as uuidv7 } from 'uuid'

/**
 * The form above a list: what it is open for, and where the eye goes as it opens and closes.
 *
 * Shape: `form` names the element around it in the page's template; `opened` is called each time it opens or closes.
 */
export function useOpenForm<Editing extends object>(form: string, opened: () => void) {
  const editing = shallowRef<Editing | null>(null)
  const around = useTemplateRef<HTMLElement>(form)
  let opener: Element | null = null
  // Made when the form is opened, so that sending it again makes nothing twice.
  let id = uuidv7()

  async function open(next: Editing | null) {
    if (!editing.value) opener = document.activeElement
    editing.value = next
    id = uuidv7()
    opened()
    await nextTick()
    // The form stands above the list, often out of sight of what has opened it.
    const goal = next ? around.value?.querySelector<HTMLElement>('input, select') : opener
    if (goal instanceof HTMLElement) goal.focus()
  }

  return { editing, open, newId: () => id }
}
