import { dirname, join } from 'node:path'
import { localPath } from '../database/localPath'

/** Where photos are kept: a folder of this machine, or a bucket of an S3-compatible store. */
export type FilesPlace
  = | { kind: 'folder', folder: string }
    | { kind: 'bucket', endpoint: string, bucket: string, region: string, accessKeyId: string, secretAccessKey: string }

/**
 * The place that FILES_URL names, or what is wrong with it; never with a value in it.
 *
 * Examples: `file:./data/files`, `s3://KEY:SECRET@s3.example.com/bucket?region=eu-central-1`, and `s3+http://…` for a
 * store on this very machine.
 *
 * @param isOwnMachine whether a URL's host is this machine: a secret goes nowhere else unencrypted.
 */
export function readFilesUrl(value: string, isOwnMachine: (url: string) => boolean): FilesPlace | string {
  if (value.startsWith('file:')) {
    const folder = decoded(value.slice('file:'.length).replace(/^\/\/(?=\/)/, ''))
    return folder ? { kind: 'folder', folder } : 'must name a folder after file:'
  }
  const scheme = /^s3(\+http)?:\/\//.exec(value)
  if (!scheme) return 'must begin with file: or s3://'
  const address = value.replace(/^s3(\+http)?:/, scheme[1] ? 'http:' : 'https:')
  if (!URL.canParse(address)) return 'must be s3://key:secret@host/bucket?region=…'
  const url = new URL(address)
  if (scheme[1] && !isOwnMachine(url.origin)) return 'must be encrypted (s3://) unless it is on this machine'
  const [accessKeyId, secretAccessKey, bucket] = [decoded(url.username), decoded(url.password), decoded(url.pathname.replace(/^\/|\/$/g, ''))]
  const region = url.searchParams.get('region')
  if (!accessKeyId || !secretAccessKey) return 'must hold the key and the secret before the host: s3://key:secret@host/bucket?region=…'
  if (!bucket || bucket.includes('/')) return 'must name one bucket after the host: s3://key:secret@host/bucket?region=…'
  if (!region) return 'must name the region: s3://key:secret@host/bucket?region=…'
  return { kind: 'bucket', endpoint: url.origin, bucket, region, accessKeyId, secretAccessKey }
}

/** Where photos are kept unless it is said: in `files` beside a local database, else in `data/files`. */
export function filesBeside(databaseUrl: string): FilesPlace {
  return { kind: 'folder', folder: databaseUrl.startsWith('file:') ? join(dirname(localPath(databaseUrl)), 'files') : './data/files' }
}

/** '' where it is not well-formed. */
function decoded(part: string): string {
  try {
    return decodeURIComponent(part)
  }
  catch {
    return ''
  }
}
