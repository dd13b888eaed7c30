/** What came back: `body` is the parsed JSON, or the text where it is none. */
export interface Answer<T = unknown> { status: number, headers: Headers, body: T }

/**
 * A browser as far as the API can tell: keeps cookies, says that its own page asks.
 *
 * Example: `const anna = new TestClient(server.baseUrl); await anna.signIn('anna@firm.example', password)`
 */
export class TestClient {
  readonly cookies = new Map<string, string>()

  constructor(readonly baseUrl: string) {}

  get<T = unknown>(path: string, headers: Record<string, string> = {}): Promise<Answer<T>> {
    return this.send<T>('GET', path, undefined, headers)
  }

  post<T = unknown>(path: string, body?: unknown, headers: Record<string, string> = {}): Promise<Answer<T>> {
    return this.send<T>('POST', path, body, headers)
  }

  put<T = unknown>(path: string, body?: unknown): Promise<Answer<T>> {
    return this.send<T>('PUT', path, body)
  }

  patch<T = unknown>(path: string, body?: unknown): Promise<Answer<T>> {
    return this.send<T>('PATCH', path, body)
  }

  delete<T = unknown>(path: string): Promise<Answer<T>> {
    return this.send<T>('DELETE', path)
  }

  signIn(email: string, password: string): Promise<Answer> {
    return this.post('/api/session', { email, password })
  }

  /** The sealed session as the browser holds it, or ''. */
  get session(): string {
    return this.cookies.get('collarbook') ?? ''
  }

  send<T>(method: string, path: string, body?: unknown, headers: Record<string, string> = {}): Promise<Answer<T>> {
    if (body === undefined) return this.ask<T>(method, path, undefined, headers)
    return this.ask<T>(method, path, JSON.stringify(body), { 'content-type': 'application/json', ...headers })
  }

  /** Posts a body as it is; its type stands among the headers. */
  sendBytes<T = unknown>(path: string, body: Buffer, headers: Record<string, string>): Promise<Answer<T>> {
    return this.ask<T>('POST', path, new Uint8Array(body), headers)
  }

  private async ask<T>(method: string, path: string, body: BodyInit | undefined, headers: Record<string, string>): Promise<Answer<T>> {
    const response = await fetch(this.baseUrl + path, {
      method,
      redirect: 'manual',
      body,
      headers: {
        'accept': 'application/json',
        'sec-fetch-site': 'same-origin',
        ...(this.cookies.size > 0 ? { cookie: [...this.cookies].map(([name, value]) => `${name}=${value}`).join('; ') } : {}),
        ...headers,
      },
    })
    this.keep(response.headers.getSetCookie())
    const text = await response.text()
    return { status: response.status, headers: response.headers, body: parsed(text) as T }
  }

  private keep(lines: string[]): void {
    for (const line of lines) {
      const [pair = ''] = line.split(';')
      const cut = pair.indexOf('=')
      const [name, value] = [pair.slice(0, cut), pair.slice(cut + 1)]
      if (value === '') this.cookies.delete(name)
      else this.cookies.set(name, value)
    }
  }
}

function parsed(text: string): unknown {
  try {
    return JSON.parse(text)
  }
  catch {
    return text
  }
}
