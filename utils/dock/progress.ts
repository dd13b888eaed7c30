import type { DockLine } from './dockLines'

/** How far a dock has come with a shipment. */
export interface DockProgress { all: number, here: number, weighed: number, missing: number, open: string[] }

/** Counts what was said of each cylinder of a shipment; `open` are those of which it is not known whether they are there. */
export function dockProgress(cylinderIds: readonly string[], lines: ReadonlyMap<string, DockLine>): DockProgress {
  const said = cylinderIds.map(id => lines.get(id))
  return {
    all: cylinderIds.length,
    here: said.filter(line => line?.here).length,
    weighed: said.filter(line => line?.here && line.theirGross !== null).length,
    missing: said.filter(line => line?.missing).length,
    open: cylinderIds.filter(id => !lines.get(id)?.here && !lines.get(id)?.missing),
  }
}
