/** A text that a spreadsheet would take for a sum to reckon. */
const RECKONED = /^[=+\-@\t\r\uFF0B\uFF0D\uFF1D\uFF20]/

/** A text as a cell of a table of values, so that a spreadsheet shows it and never reckons it. */
export function csvText(text: string): string {
  return RECKONED.test(text) ? `'${text}` : text
}
