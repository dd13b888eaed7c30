/** One field that did not fit: `path` is dotted, '' for the whole. */
export interface ProblemError { path: string, message: string }

/** How the server says that something did not work (RFC 9457, application/problem+json). */
export interface ProblemDetails {
  /** 'about:blank', or a stable code of ours such as 'last-admin'. */
  type: string
  title: string
  status: number
  detail: string
  errors?: ProblemError[]
}
