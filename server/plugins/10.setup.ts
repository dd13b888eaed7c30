import { defineNitroPlugin } from '#imports'
import { startDatabase } from '../utils/database/start'
import { useEnvironment } from '../utils/environment'
import { isEmpty, offerSetUp } from '../utils/setUp/setUp'

if (!import.meta.prerender) {
  const environment = useEnvironment()
  await startDatabase(environment)
  if (await isEmpty()) {
    const link = await offerSetUp(environment.publicUrl, Date.now())
    console.log(`\nThis Collarbook is empty. Set it up here, once, within 7 days:\n  ${link}\n`)
  }
}

export default defineNitroPlugin(() => undefined)
