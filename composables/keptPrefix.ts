/** What the names of all that is kept for a person begin with. */
export function keptPrefix(personId: string | undefined): string {
  return `collarbook-form ${personId ?? ''} `
}
