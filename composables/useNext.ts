/**
 * Where to go after signing in: a page of this application, never another site.
 *
 * Shape: a path that begins with one slash. What a browser would read as another host ('//host', '/\host') is not one.
 */
export function safeNext(next: unknown): string {
  if (typeof next !== 'string' || !/^\/(?![/\\])/.test(next)) return '/'
  // eslint-disable-next-line no-control-regex
  if (/[\u0000-\u001F\\]/.test(next) || next.startsWith('/sign-in')) return '/'
  return next
}

/** Where the address of this page says to go on to. */
export function useNext() {
  const route = useRoute()
  return computed(() => safeNext(route.query.next))
}
