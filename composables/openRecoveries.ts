import { keptPrefix } from '~~/composables/useKept'

/** A recovery that this person began on this device and has not recorded. */
export interface OpenRecovery { id: string, labelCode: string | null, name: string }

/** What a recovery is kept under, behind the cylinder's id. */
export const RECOVERY = 'recovery'

/** The recoveries that a person has open on this device. */
export function openRecoveries(personId: string | undefined): OpenRecovery[] {
  const prefix = keptPrefix(personId)
  try {
    return Object.entries(localStorage)
      .filter(([key]) => key.startsWith(prefix) && key.endsWith(` ${RECOVERY}`))
      .flatMap(([, text]) => {
        const { cylinder } = Object(Object(JSON.parse(String(text))).draft) as { cylinder?: OpenRecovery }
        return cylinder ? [cylinder] : []
      })
  }
  catch {
    // Without storage nothing is kept.
    return []
  }
}
