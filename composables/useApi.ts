import { standIn } from '~~/composables/standIn'
import { useCopyOf } from '~~/composables/useCopyOf'
import type { ProblemDetails, ProblemError } from '~~/utils/contract/problem'

type Query = Record<string, string | number | boolean | null | undefined>
/** An answer of this device's copy, and of when the copy is. */
interface Kept<T> { answer: T, of: number }
/** How something is asked for; `later` takes the server's answer where the copy's has stood in for it, and tells whether it is shown. */
interface Getting<T> { staysHere?: boolean, later?: (answer: T) => boolean }
type Method = 'GET' | 'POST' | 'PUT' | 'PATCH' | 'DELETE'

/** Something that the server refused, or that never reached it. */
export class ApiError extends Error {
  override readonly name = 'ApiError'
  /** As h3 and Nuxt read it; 0 when the server was not reached. */
  readonly statusCode: number
  readonly data: ProblemDetails

  constructor(problem: ProblemDetails) {
    super(problem.detail || problem.title)
    this.statusCode = problem.status
    this.data = problem
  }
}

const NOT_REACHED: ProblemDetails = {
  type: 'about:blank', title: 'No connection', status: 0,
  detail: 'The server was not reached. Nothing was lost; try again when there is signal.',
}

/** The problem behind any error, in the words of whoever found it. */
export function problemOf(error: unknown): ProblemDetails {
  const { data, status, statusCode, message } = Object(error) as
    { data?: unknown, status?: number, statusCode?: number, message?: string }
  if (isProblem(data)) return { type: data.type ?? 'about:blank', title: data.title, status: data.status, detail: data.detail ?? '', errors: data.errors }
  const code = statusCode ?? status
  if (code === undefined) return NOT_REACHED
  return { type: 'about:blank', title: 'That did not work', status: code, detail: code >= 500 ? 'The server could not answer. Try again.' : message ?? '' }
}

/** Whether a body is a problem as the server tells it; another's page is none. */
export function isProblem(data: unknown): data is Partial<ProblemDetails> & Pick<ProblemDetails, 'title' | 'status'> {
  const { title, status } = Object(data) as Partial<ProblemDetails>
  return typeof title === 'string' && typeof status === 'number'
}

/** The errors of a problem that belong to one field, as one text; null where there are none. */
export function errorAt(problem: { errors?: ProblemError[] } | null, path: string): string | null {
  const found = problem?.errors?.filter(error => error.path === path || error.path.startsWith(`${path}.`)) ?? []
  return found.length ? found.map(error => error.message).join(' ') : null
}

/**
 * The server's routes, with the person's cookies on both sides. Call it in the set-up of a component or a store. What is
 * only read comes from this device's copy where the server is not reached, or is long in answering, and the copy can tell.
 *
 * Errors: every failure is an {@link ApiError}; a session that ended leads to the sign-in page and back.
 */
export function useApi() {
  const request = useRequestFetch()
  const nuxt = useNuxtApp()
  const router = useRouter()
  const copyOf = useCopyOf()

  async function get<T>(path: string, query?: Query, { staysHere = false, later }: Getting<T> = {}): Promise<T> {
    if (import.meta.server) return call<T>('GET', path, { query })
    if (!navigator.onLine) {
      const kept = await fromCopy<T>(path, query)
      if (kept) return shown(kept)
    }
    const before = copyOf.value
    const asked = call<T>('GET', path, { query, staysHere })
    const instead = await standIn(asked, () => fromCopy<T>(path, query).catch(() => null))
    if (instead) {
      asked.then((answer) => {
        if (later?.(answer)) copyOf.value = null
      }, () => {})
      return shown(instead)
    }
    try {
      const answer = await asked
      // What else was asked meanwhile may have come from the copy, and stands beside this.
      if (copyOf.value === before) copyOf.value = null
      return answer
    }
    catch (error) {
      const kept = problemOf(error).status === 0 ? await fromCopy<T>(path, query) : null
      if (kept) return shown(kept)
      throw error
    }
  }

  async function fromCopy<T>(path: string, query?: Query): Promise<Kept<T> | null> {
    try {
      return await nuxt.$answerFromCopy(path, query) as Kept<T> | null
    }
    catch (error) {
      throw new ApiError(problemOf(error))
    }
  }

  function shown<T>({ answer, of }: Kept<T>): T {
    copyOf.value = of
    return answer
  }

  async function call<T>(method: Method, path: string, options: { query?: Query, body?: unknown, staysHere?: boolean } = {}): Promise<T> {
    try {
      return await request<T>(path, {
        method,
        query: options.query,
        ...(options.body === undefined ? {} : { body: options.body as Record<string, unknown> }),
        // A second sending is the person's to decide: an event is not sent twice behind their back.
        retry: false,
      }) as T
    }
    catch (error) {
      const problem = problemOf(error)
      if (problem.status === 401 && import.meta.client && !options.staysHere && !path.startsWith('/api/session')) {
        // By a fresh page: this one still believes that its person is signed in, and holds what they read.
        await nuxt.runWithContext(() => navigateTo({ path: '/sign-in', query: { next: router.currentRoute.value.fullPath } }, { external: true }))
      }
      throw new ApiError(problem)
    }
  }

  return {
    get: <T>(path: string, query?: Query, later?: (answer: T) => boolean) => get<T>(path, query, { later }),
    /** The same beside what a person does: where the session has ended it fails, and leads nowhere. */
    getAside: <T>(path: string, query?: Query) => get<T>(path, query, { staysHere: true }),
    /** From the server or not at all. */
    getFresh: <T>(path: string, query?: Query) => call<T>('GET', path, { query }),
    post: <T>(path: string, body: unknown) => call<T>('POST', path, { body }),
    put: <T>(path: string, body: unknown) => call<T>('PUT', path, { body }),
    patch: <T>(path: string, body: unknown) => call<T>('PATCH', path, { body }),
    del: <T>(path: string) => call<T>('DELETE', path),
  }
}
