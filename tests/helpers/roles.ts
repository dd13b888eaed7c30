const IMPLIED: Record<string, string> = {
  'button': 'button', 'a[href]': 'link', 'select': 'combobox', 'textarea': 'textbox', 'table': 'table', 'li': 'listitem', 'dialog': 'dialog',
  'main': 'main', 'nav': 'navigation', 'header': 'banner', 'fieldset': 'group', 'figure': 'figure', 'output': 'status',
  'section[aria-label],section[aria-labelledby]': 'region', 'h1,h2,h3': 'heading', 'th[scope=col]': 'columnheader', 'th[scope=row]': 'rowheader',
  'input[type=checkbox]': 'checkbox', 'input:not([type]),input[type=text],input[type=email],input[type=tel]': 'textbox',
}

/** The elements of a role, as a screen reader meets them, with their names where one is asked for. */
export function allByRole(root: Element, role: string, name?: string | RegExp): HTMLElement[] {
  const implied = Object.keys(IMPLIED).filter(selector => IMPLIED[selector] === role).flatMap(selector => selector.split(','))
  const selector = [`[role=${role}]`, ...implied].join(',')
  const all = [root, ...root.querySelectorAll<HTMLElement>(selector)]
    .filter((element): element is HTMLElement => element.matches(selector))
    .filter(element => (element.getAttribute('role') ?? role) === role)
  return name === undefined ? all : all.filter(element => matches(nameOf(element), name))
}

/** The one element of a role and name. Errors: throws where there is none, or more than one. */
export function byRole(root: Element, role: string, name?: string | RegExp): HTMLElement {
  const found = allByRole(root, role, name)
  if (found.length !== 1) throw new Error(`${found.length} elements of role ${role} named ${String(name)} in:\n${root.outerHTML}`)
  return found[0]!
}

/** The name by which an element is read out. */
function nameOf(element: HTMLElement): string {
  const labelled = element.getAttribute('aria-labelledby')
  if (labelled) return words(element.ownerDocument.getElementById(labelled))
  const label = element.getAttribute('aria-label')
  if (label) return label
  if (element.matches('input,select,textarea')) {
    const own = element.id ? rootOf(element).querySelector(`label[for="${element.id}"]`) : null
    return words(own ?? element.closest('label'))
  }
  if (element.matches('table')) return words(element.querySelector('caption'))
  if (element.matches('fieldset')) return words(element.querySelector('legend'))
  return words(element)
}

function rootOf(element: Element): Element {
  return element.parentElement ? rootOf(element.parentElement) : element
}

function words(element: Element | null): string {
  const spoken = element?.cloneNode(true) as Element | undefined
  spoken?.querySelectorAll('[aria-hidden=true]').forEach(silent => silent.remove())
  return (spoken?.textContent ?? '').replaceAll(/\s+/g, ' ').trim()
}

function matches(text: string, name: string | RegExp): boolean {
  return typeof name === 'string' ? text === name : name.test(text)
}
