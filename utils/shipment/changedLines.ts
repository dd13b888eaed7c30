import type { CylinderRow } from '../custody/cylinderView'
import { KIND_WORDS } from '../custody/words'
import { formatLabelCode } from '../label/code'

/** What a cylinder is called in a list: its label code, else its serial. */
export function cylinderName(cylinder: Pick<CylinderRow, 'labelCode' | 'serial'>): string {
  if (cylinder.labelCode !== null) return formatLabelCode(cylinder.labelCode)
  return cylinder.serial === null ? 'without a label' : `serial ${cylinder.serial}`
}

interface Line { cylinder: CylinderRow, version: number }

/** What happened to the cylinders of a list since it was looked at, a sentence each; a new version of a cylinder is a new event. */
export function changedLines(before: readonly Line[], after: readonly Line[]): string[] {
  const now = new Map(after.map(line => [line.cylinder.id, line]))
  const gone = before.filter(line => !now.has(line.cylinder.id)).map(line => `${cylinderName(line.cylinder)} is no longer on the list.`)
  const newer = before.flatMap((line) => {
    const present = now.get(line.cylinder.id)
    if (!present || present.version === line.version) return []
    const kind = present.cylinder.lastEventKind
    return `${cylinderName(present.cylinder)} was ${kind ? KIND_WORDS[kind].done.toLowerCase() : 'changed'} meanwhile.`
  })
  return [...gone, ...newer]
}
