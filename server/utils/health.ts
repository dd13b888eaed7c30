import { version } from '../../package.json'
import type { Health } from '../../utils/contract/firm'
import { useDatabase } from './database/currentDatabase'

/** Whether the database can be read and written. */
export async function health(): Promise<Health> {
  try {
    await useDatabase().probe()
    return { ok: true, version, database: 'ok' }
  }
  catch {
    return { ok: false, version, database: 'unreachable' }
  }
}
