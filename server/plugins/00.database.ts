import { defineNitroPlugin } from '#imports'
import { startDatabase } from '../utils/database/start'
import { EnvironmentError, useEnvironment } from '../utils/environment'
import { dummyHash } from '../utils/session/password'
import { configureSessionCookie } from '../utils/session/sessionCookie'

async function start(): Promise<void> {
  const environment = useEnvironment()
  configureSessionCookie(environment)
  if (environment.unprotected) console.warn(`${environment.publicUrl} is plain http: passwords can be read on the way, and phones open no camera. Put it behind https.`)
  await startDatabase(environment)
  await dummyHash()
}

// Awaited here, at the top: the framework does not wait for a plugin, and the server must not listen before.
if (!import.meta.prerender) {
  await start().catch((error: unknown) => {
    const because = error instanceof EnvironmentError ? `these settings are wrong: ${error.message}` : error instanceof Error ? error.message : String(error)
    console.error(`Collarbook cannot start: ${because}`)
    process.exit(1)
  })
}

export default defineNitroPlugin(() => undefined)
