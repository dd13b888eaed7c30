import { mkdtempSync, readdirSync, rmSync, writeFileSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { afterEach, beforeEach, describe, expect, it } from 'vitest'
import { photoFiles } from '../../../server/utils/files/photoFiles'
import { startBucketServer, type BucketServer } from '../../helpers/bucketServer'

const BYTES = Uint8Array.from([0xFF, 0xD8, 0x00, 0x80, 0x0A, 0xFF, 0xD9])

describe('a folder for photos', () => {
  let folder: string
  beforeEach(() => {
    folder = mkdtempSync(join(tmpdir(), 'collarbook-files-'))
  })
  afterEach(() => rmSync(folder, { recursive: true, force: true }))

  it('is made where it is not there, and gives back the very bytes', async () => {
    const files = photoFiles({ kind: 'folder', folder: join(folder, 'deep/files') })
    await files.keep('one.jpg', BYTES)
    expect(await files.read('one.jpg')).toEqual(Buffer.from(BYTES))
    expect(await files.read('two.jpg')).toBeNull()
  })

  it('is tried by a file that does not stay', async () => {
    await photoFiles({ kind: 'folder', folder }).probe()
    expect(readdirSync(folder)).toEqual([])
  })

  it('that takes nothing is told as 503, and fails its trial', async () => {
    writeFileSync(join(folder, 'a-file'), '')
    const files = photoFiles({ kind: 'folder', folder: join(folder, 'a-file') })
    await expect(files.keep('one.jpg', BYTES)).rejects.toMatchObject({ details: { status: 503, type: 'files-unavailable' } })
    await expect(files.probe()).rejects.toThrow()
  })
})

describe('a bucket for photos', () => {
  const KEY = { accessKeyId: 'TESTKEY', secretAccessKey: 'test/secret+1', region: 'local-1' }
  let store: BucketServer
  const bucketAt = (port: number, bucket = 'photos', key = KEY) => photoFiles({ kind: 'bucket', endpoint: `http://127.0.0.1:${port}`, bucket, ...key })
  beforeEach(async () => {
    store = await startBucketServer({ bucket: 'photos', accessKeyId: KEY.accessKeyId })
  })
  afterEach(() => store.stop())

  it('gives back the very bytes, by signed requests that do not hold the secret', async () => {
    const files = bucketAt(store.port)
    await files.keep('one.jpg', BYTES)
    expect(store.objects.get('one.jpg')).toEqual(Buffer.from(BYTES))
    expect(await files.read('one.jpg')).toEqual(Buffer.from(BYTES))
    expect(await files.read('two.jpg')).toBeNull()
    expect(store.signatures.join()).toContain('/local-1/s3/aws4_request')
    expect(store.signatures.join()).not.toContain('secret')
  })

  it('is tried by a file that does not stay', async () => {
    await bucketAt(store.port).probe()
    expect(store.objects.size).toBe(0)
  })

  it('that is not there, or whose key is another, fails its trial by what the store answers', async () => {
    await expect(bucketAt(store.port, 'elsewhere').probe()).rejects.toThrow(/404/)
    await expect(bucketAt(store.port, 'photos', { ...KEY, accessKeyId: 'OTHER' }).probe()).rejects.toThrow(/403/)
  })

  it('that is not there keeps nothing and says so', async () => {
    await expect(bucketAt(store.port, 'elsewhere').keep('one.jpg', BYTES)).rejects.toMatchObject({ details: { status: 503 } })
  })

  it('out of reach is told as 503', async () => {
    const { port } = store
    await store.stop()
    await expect(bucketAt(port).keep('one.jpg', BYTES)).rejects.toMatchObject({ details: { status: 503 } })
    await expect(bucketAt(port).read('one.jpg')).rejects.toMatchObject({ details: { status: 503 } })
  })
})
