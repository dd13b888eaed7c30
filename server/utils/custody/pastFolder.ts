import { mkdtempSync, readdirSync, rmSync } from 'node:fs'
import { hostname, tmpdir } from 'node:os'
import { join } from 'node:path'

/** Of this machine: where several share the place for temporary files, a process of another may have any number. */
const PREFIX = `collarbook-past-${encodeURIComponent(hostname())}-`

const folders: string[] = []

/** A new folder for databases of the past that goes with the process; the first takes away what killed ones left. */
export function pastFolder(): string {
  if (folders.length === 0) {
    sweep()
    process.once('exit', () => folders.forEach(take))
  }
  const folder = mkdtempSync(join(tmpdir(), `${PREFIX}${process.pid}-`))
  folders.push(folder)
  return folder
}

function sweep(): void {
  for (const name of readdirSync(tmpdir())) {
    const pid = name.startsWith(PREFIX) ? /^(\d+)-/.exec(name.slice(PREFIX.length))?.[1] : undefined
    if (pid !== undefined && !isAlive(Number(pid))) take(join(tmpdir(), name))
  }
}

/** A process of somebody else's may not be spoken to, but it is there. */
function isAlive(pid: number): boolean {
  try {
    return process.kill(pid, 0)
  }
  catch (error) {
    return (error as NodeJS.ErrnoException).code !== 'ESRCH'
  }
}

function take(folder: string): void {
  rmSync(folder, { recursive: true, force: true })
}
