import { z } from 'zod'

/** Shorter ones can be guessed; the seal of the session cookie asks for 32 as well. */
const LEAST_SESSION_PASSWORD = 32
const LEAST_DISTINCT_CHARACTERS = 8
const LOOPBACK_HOSTS = new Set(['localhost', '127.0.0.1', '[::1]'])

const databaseUrl = z.string()
  .refine(value => /^(file:.|libsql:\/\/|wss?:\/\/|https?:\/\/)/.test(value), 'must begin with file:, libsql:// or https://')
  .refine(value => !/^(http|ws):/.test(value) || isLoopback(value), 'must be encrypted (libsql:// or https://) unless it is on this machine')

const schema = z.object({
  PORT: z.coerce.number('must be a number').int().min(0).max(65_535).default(3000),
  HOST: z.string().optional(),
  DATABASE_URL: databaseUrl.default('file:./data/collarbook.db'),
  DATABASE_AUTH_TOKEN: z.string().optional(),
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
  COLLARBOOK_DEMO: z.enum(['0', '1'], 'must be 0 or 1').default('0'),
}).refine(values => !values.SMTP_URL || values.MAIL_FROM, { path: ['MAIL_FROM'], message: 'must be set where SMTP_URL is' })

/** The server's settings, as the process found them at start. */
export interface Environment {
  databaseUrl: string
  databaseAuthToken: string | undefined
  smtpUrl: string | undefined
  mailFrom: string | undefined
  /** Where people reach the server, without a slash at the end. */
  publicUrl: string
  /** Whether people reach it by https. */
  secure: boolean
  /** Whether passwords go over a network in clear. */
  unprotected: boolean
  proxyHops: number
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
    smtpUrl: values.SMTP_URL,
    mailFrom: values.MAIL_FROM,
    publicUrl: values.PUBLIC_URL,
    secure: values.PUBLIC_URL.startsWith('https:'),
    unprotected: values.PUBLIC_URL.startsWith('http:') && !isLoopback(values.PUBLIC_URL),
    proxyHops: values.PROXY_HOPS,
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
