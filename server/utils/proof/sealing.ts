import { randomBytes } from 'node:crypto'
import { mkdirSync, readFileSync, writeFileSync } from 'node:fs'
import { basename, dirname } from 'node:path'
import { firm } from '../../../drizzle/schema'
import { originOf } from '../../../utils/proof/checkpoint'
import type { Database } from '../database/database'
import { useEnvironment } from '../environment'
import { problem } from '../http/problem'
import { signerOf, type Signer } from './signingKey'

/** What signs a firm's checkpoints, what is believed of them, and where their copies are kept. */
export interface Sealing {
  /** The name of the log. */
  origin: string
  signer: Signer
  /** Public keys: of the signer, and of those before it. */
  trusted: string[]
  copies: string
}

/** The settings that sealing depends on. */
export interface SealingSettings {
  /** Base64 of 32 bytes; undefined where the key is kept in a file. */
  checkpointKey: string | undefined
  formerCheckpointKeys: string[]
}

/** The key and its copies beside the database file, never in it; with a database server, in the data folder. */
const FOLDER_OF_A_SERVER = 'data/collarbook'

/** The sealing of the firm's log; null before the set-up. The first time it makes the key, where none is set. */
export async function sealing(db: Database, settings: SealingSettings = useEnvironment()): Promise<Sealing | null> {
  const [row] = await db.read.select({ id: firm.id }).from(firm).limit(1)
  if (!row) return null
  const beside = db.file ?? FOLDER_OF_A_SERVER
  const origin = originOf(row.id)
  const signer = signerOf(origin, settings.checkpointKey === undefined ? keyFromFile(`${beside}.key`) : Buffer.from(settings.checkpointKey, 'base64'))
  return { origin, signer, trusted: [signer.publicKey, ...settings.formerCheckpointKeys], copies: `${beside}.checkpoints` }
}

/** The same where it is needed. Errors: 404 before the set-up. */
export async function sealingNow(db: Database): Promise<Sealing> {
  const seal = await sealing(db)
  if (!seal) throw problem(404, 'Not set up', 'This Collarbook has not been set up yet.', undefined, { type: 'not-set-up' })
  return seal
}

/** Errors: 500 where the file holds no key. */
function keyFromFile(file: string): Buffer {
  const seed = Buffer.from(readOrMake(file), 'base64')
  if (seed.length !== 32) {
    throw problem(500, 'The key that signs the log cannot be read',
      `The file ${basename(file)} does not hold a key: 32 bytes in base64. Put the right file back, or set CHECKPOINT_KEY.`)
  }
  return seed
}

function readOrMake(file: string): string {
  mkdirSync(dirname(file), { recursive: true })
  try {
    // Fails where the file is there: another process may have been first.
    writeFileSync(file, `${randomBytes(32).toString('base64')}\n`, { mode: 0o600, flag: 'wx' })
  }
  catch (error) {
    if ((error as { code?: string }).code !== 'EEXIST') throw error
  }
  return readFileSync(file, 'utf8')
}
