import { defineNitroPlugin } from '#imports'
import { startDatabase } from '../utils/database/start'
import { DEMO_PASSWORD } from '../utils/demo/cast'
import { sealHistory } from '../utils/demo/checkpoints'
import { fillDemo } from '../utils/demo/fillDemo'
import { keepDemoPhotos } from '../utils/demo/photos'
import { keepDemoStatement } from '../utils/demo/statementFile'
import { useEnvironment } from '../utils/environment'
import { useFiles } from '../utils/files/photoFiles'
import { sealingNow } from '../utils/proof/sealing'
import { hashNewPassword } from '../utils/session/password'
import { isEmpty, offerSetUp } from '../utils/setUp/setUp'

const DEMO_ACCOUNTS = ['warehouse', 'technician', 'manager', 'auditor', 'admin', 'trainee']

async function prepare(): Promise<void> {
  const environment = useEnvironment()
  const database = await startDatabase(environment)
  if (environment.demo) {
    if (await isEmpty()) console.log('Making the demo firm: eighteen months of its history. This takes some seconds.')
    const now = Date.now()
    if (await fillDemo(database, await hashNewPassword(DEMO_PASSWORD), now)) {
      await keepDemoPhotos(database, useFiles())
      await keepDemoStatement(database, useFiles())
      await sealHistory(database, await sealingNow(database), now)
    }
    console.log(`\nThe demo firm is at ${environment.publicUrl}\nSign in as ${DEMO_ACCOUNTS.map(name => `${name}@demo.example`).join(', ')}\nPassword of each: ${DEMO_PASSWORD}\n`)
  }
  else if (await isEmpty()) {
    const link = await offerSetUp(environment.publicUrl, Date.now())
    console.log(`\nThis Collarbook is empty. Set it up here, once, within 7 days:\n  ${link}\n`)
  }
}

if (!import.meta.prerender) {
  await prepare().catch((error: unknown) => {
    console.error(`Collarbook cannot start: ${error instanceof Error ? error.message : String(error)}`)
    process.exit(1)
  })
}

export default defineNitroPlugin(() => undefined)
