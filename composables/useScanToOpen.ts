import { useWedge } from '~~/composables/useWedge'
import { usePostingStore } from '~~/stores/posting'
import { formatLabelCode } from '~~/utils/label/code'

/**
 * What a hand scanner does on a page that has no other use for a label: it opens the cylinder.
 *
 * Whoever fills in a form is not led away from it, and finds no code in its fields.
 */
export function useScanToOpen(open: (code: string) => unknown = openCylinder) {
  const posting = usePostingStore()
  useWedge((code, field) => {
    if (field && !field.matches('[data-search], [data-code-field]')) return posting.say(`${formatLabelCode(code)} was scanned. Leave the field, then scan to open it.`)
    void open(code)
  })
}

/** Opens the page of the cylinder with a label code. */
export function openCylinder(code: string) {
  return navigateTo(`/c/${code.toLowerCase()}`)
}
