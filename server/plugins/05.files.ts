import { defineNitroPlugin } from '#imports'
import { useEnvironment } from '../utils/environment'
import { useFiles } from '../utils/files/photoFiles'

/** A folder that takes no files, or an answer of the bucket's store, is a wrong setting; a store out of reach is not. */
async function check(): Promise<void> {
  try {
    await useFiles().probe()
  }
  catch (error) {
    const because = (error instanceof Error ? error.message : String(error)).replace(/https?:\/\/\S+/g, 'the store').slice(0, 300)
    if (useEnvironment().files.kind === 'folder' || /\b4\d\d\b/.test(because)) {
      console.error(`Collarbook cannot start: these settings are wrong: FILES_URL names a place that takes no files (${because})`)
      process.exit(1)
    }
    console.warn('FILES_URL: the store of photos is not reached. Photos wait on their phones until it is.')
  }
}

if (!import.meta.prerender) await check()

export default defineNitroPlugin(() => undefined)
