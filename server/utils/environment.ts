import { z } from 'zod'
import { filesBeside, readFilesUrl, type FilesPlace } from './files/filesUrl'

/** Shorter ones can be guessed; the seal of the session cookie asks for 32 as well. */
const LEAST_SESSION_PASSWORD = 32
const LEAST_DISTINCT_CHARACTERS = 8
const LOOPBACK_HOSTS = new Set(['localhost', '127.0.0.1', '[::1]'])

const databaseUrl = z.string()
  .refine(value => /^(file:.|libsql:\/\/|wss?:\/\/|https?:\/\/)/.test(value), 'must begin with file:, libsql:// or https://')
  .refine(value => !/^(http|ws):/.test(value) || isLoopback(value), 'must be encrypted (libsql:// or https://) unless it is on this machine')

/** 32 bytes in base64, as `openssl rand -base64 32` gives them. */
const CHECKPOINT_KEY = /^[A-Za-z0-9+/]{43}=$/
/** As C2SP signed-note writes a public key: name, id, key. */
const PUBLIC_KEY = /^[^\s+]+\+[0-9a-f]{8}\+[A-Za-z0-9+/]{44}$/

const schema = z.object({
  PORT: z.coerce.number('must be a number').int().min(0).max(65_535).default(3000),
  HOST: z.string().optional(),
  DATABASE_URL: databaseUrl.default('file:./data/collarbook.db'),
  DATABASE_AUTH_TOKEN: z.string().optional(),
  FILES_URL: z.string().transform((value, context) => {
    const place = readFilesUrl(value, isLoopback)
    if (typeof place !== 'string') return place
    context.addIssue({ code: 'custom', message: place })
    return z.NEVER
  }).optional(),
  SMTP_URL: z.string().regex(/^smtps?:\/\/[^/]+/, 'must begin with smtp:// or smtps://').optional(),
  MAIL_FROM: z.string().regex(/@/, 'must be an email address').optional(),
  PUBLIC_URL: z.string().refine(isOrigin, 'must be http(s)://host[:port] without a path').default('http://localhost:3000')
    .transform(value => new URL(value).origin),
  /** How many proxies of ours stand before the server; their X-Forwarded-For is believed, no other. */
  PROXY_HOPS: z.coerce.number('must be a number').int().min(0).max(5).default(0),
  NUXT_SESSION_PASSWORD: z.string('must be set: 32 or more random characters')
    .min(LEAST_SESSION_PASSWORD, `must have at least ${LEAST_SESSION_PASSWORD} characters`)
    .refine(value => !/example|change|replace|password|secret/i.test(value), 'is an example: make one, for instance with `openssl rand -hex 32`')
    .refine(value => new Set(value).size >= LEAST_DISTINCT_CHARACTERS, 'repeats itself: make one, for instance with `openssl rand -hex 32`'),
  CHECKPOINT_KEY: z.string().regex(CHECKPOINT_KEY, 'must be 32 bytes in base64: make one with `openssl rand -base64 32`').optional(),
  CHECKPOINT_FORMER_KEYS: z.string().default('').transform(value => value.split(/[\s,]+/).filter(key => key !== ''))
    .refine(keys => keys.every(key => PUBLIC_KEY.test(key)), 'must be public keys as the log shows them, with spaces between'),
  COLLARBOOK_DEMO: z.enum(['0', '1'], 'must be 0 or 1').default('0'),
}).refine(values => !values.SMTP_URL || values.MAIL_FROM, { path: ['MAIL_FROM'], message: 'must be set where SMTP_URL is' })

/** The server's settings, as the process found them at start. */
export interface Environment {
  databaseUrl: string
  databaseAuthToken: string | undefined
  /** Where photos are kept. */
  files: FilesPlace
  smtpUrl: string | undefined
  mailFrom: string | undefined
  /** Where people reach the server, without a slash at the end. */
  publicUrl: string
  /** Whether people reach it by https. */
  secure: boolean
  /** Whether passwords go over a network in clear. */
  unprotected: boolean
  proxyHops: number
  /** What seals the session cookie, and what other keys are derived from. */
  secret: string
  /** Signs the checkpoints of the log; undefined where the key is kept in a file. */
  checkpointKey: string | undefined
  /** Public keys that signed checkpoints before. */
  formerCheckpointKeys: string[]
  demo: boolean
}

/** A setting that is missing or wrong; the message names each, and never holds a value. */
export class EnvironmentError extends Error {}

/**
 * Reads the settings; an empty one counts as not set.
 *
 * Errors: {@link EnvironmentError} naming every wrong setting.
 */
export function readEnvironment(variables: Record<string, string | undefined>): Environment {
  const set = Object.fromEntries(Object.entries(variables).filter(([, value]) => value !== undefined && value !== ''))
  const result = schema.safeParse(set)
  if (!result.success) {
    throw new EnvironmentError(result.error.issues.map(issue => `${issue.path.join('.')} ${issue.message}`).join('; '))
  }
  const values = result.data
  return {
    databaseUrl: values.DATABASE_URL,
    databaseAuthToken: values.DATABASE_AUTH_TOKEN,
    files: values.FILES_URL ?? filesBeside(values.DATABASE_URL),
    smtpUrl: values.SMTP_URL,
    mailFrom: values.MAIL_FROM,
    publicUrl: values.PUBLIC_URL,
    secure: values.PUBLIC_URL.startsWith('https:'),
    unprotected: values.PUBLIC_URL.startsWith('http:') && !isLoopback(values.PUBLIC_URL),
    proxyHops: values.PROXY_HOPS,
    secret: values.NUXT_SESSION_PASSWORD,
    checkpointKey: values.CHECKPOINT_KEY,
    formerCheckpointKeys: values.CHECKPOINT_FORMER_KEYS,
    demo: values.COLLARBOOK_DEMO === '1',
  }
}

let current: Environment | null = null

/** The settings of this process, read once. */
export function useEnvironment(): Environment {
  current ??= readEnvironment(process.env)
  return current
}

function isOrigin(value: string): boolean {
  if (!URL.canParse(value)) return false
  const url = new URL(value)
  return /^https?:$/.test(url.protocol) && url.pathname === '/' && !url.search && !url.hash && !url.username
}

function isLoopback(value: string): boolean {
  return URL.canParse(value) && LOOPBACK_HOSTS.has(new URL(value.replace(/^ws/, 'http')).hostname)
}
