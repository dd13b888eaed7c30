import { readFileSync } from 'node:fs'
import { createRequire } from 'node:module'
import type { AxeResults, RunOptions } from 'axe-core'
import type { Page } from 'playwright-core'

const AXE = readFileSync(createRequire(import.meta.url).resolve('axe-core/axe.min.js'), 'utf8')
/** What a change of colours can change. */
const COLOUR_RULES: RunOptions = { runOnly: ['color-contrast', 'link-in-text-block'] }

/** What axe finds serious or critical on a page as it stands, each with its elements. */
export async function seriousOn(page: Page, what: 'everything' | 'colours' = 'everything'): Promise<string[]> {
  if (!await page.evaluate(() => 'axe' in window)) await page.evaluate(AXE)
  const results = await page.evaluate(
    options => (window as unknown as { axe: { run: (options: object) => Promise<AxeResults> } }).axe.run(options),
    { resultTypes: ['violations'], ...(what === 'colours' && COLOUR_RULES) } satisfies RunOptions,
  )
  return results.violations
    .filter(violation => violation.impact === 'serious' || violation.impact === 'critical')
    .flatMap(violation => violation.nodes.map(node => `${violation.id}: ${node.html.slice(0, 160)} ${node.any[0]?.message ?? ''}`))
}

/** How far a page, or a part of it that has no name of its own, is wider than the window. */
export function sidewaysScroll(page: Page): Promise<string[]> {
  return page.evaluate(() => {
    const root = document.scrollingElement ?? document.documentElement
    const whole = root.scrollWidth > window.innerWidth ? [`the page: ${root.scrollWidth} px in ${window.innerWidth}`] : []
    const parts = [...document.body.querySelectorAll<HTMLElement>('*')]
      .filter(element => ['auto', 'scroll'].includes(getComputedStyle(element).overflowX) && element.scrollWidth > element.clientWidth + 1)
      .filter(element => !element.matches('textarea, input, select') && !element.closest('[role=region][aria-label], [role=region][aria-labelledby], section[aria-label], section[aria-labelledby]'))
    return [...whole, ...parts.map(element => `${element.tagName} ${element.className}: ${element.scrollWidth} px in ${element.clientWidth}`)]
  })
}

/** What a thumb presses on a page and is lower than that; a link within a sentence is none. */
export function targetsLowerThan(page: Page, height: number): Promise<string[]> {
  return page.evaluate((least) => {
    const words = (element: Element | null) => (element?.textContent ?? '').replaceAll(/\s+/g, ' ').trim()
    const isWithinText = (element: Element) =>
      getComputedStyle(element).display === 'inline' && words(element.parentElement).length > words(element).length
    // What is pressed for a box, or to choose a file, is its label.
    const pressed = (element: Element) => element.matches('input[type=checkbox], input[type=radio], input[type=file]') ? element.closest('label') ?? element : element
    return [...document.querySelectorAll('button, a[href], summary, select, input:not([type=hidden]), [role=button], [role=tab]')]
      .filter(element => element.checkVisibility({ visibilityProperty: true }) && !isWithinText(element))
      .map(element => ({ element, box: pressed(element).getBoundingClientRect() }))
      // A link that shows itself to the keyboard alone is folded up to a dot.
      .filter(({ box }) => box.width > 1 && box.height > 1 && box.bottom + window.scrollY > 0)
      .filter(({ box }) => box.height < least - 0.5)
      .map(({ element, box }) => `${element.tagName} "${words(element) || (element.getAttribute('aria-label') ?? element.id)}": ${Math.round(box.height)} px`)
  }, height)
}
