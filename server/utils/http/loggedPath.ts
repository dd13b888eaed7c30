/** A path as it may stand in a server's log: without its query, and without what opens something to whoever reads it. */
export function loggedPath(path: string): string {
  return path.replace(/\?.*$/s, '').replace(/^(\/api\/(?:dock|invitations)\/)[^/]+/, '$1…')
}
