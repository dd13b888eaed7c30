import type { ShippingDescription } from './shippingDescription'
import { isHazardous, unclassified } from './shippingDescription'

/** Something that keeps the papers from being made. */
export interface MissingForPapers { code: 'emergency-telephone' | 'not-classified', text: string, cylinderId: string | null, source: string }

/** What of a shipment the papers hang on. */
export interface PapersReadiness {
  emergencyTelephone: string | null
  lines: readonly { cylinderId: string, description: Pick<ShippingDescription, 'needsChoice' | 'identification' | 'because'> }[]
}

/**
 * What must be known before a shipment may leave with its papers; empty where nothing is missing.
 *
 * Source: 49 CFR 172.604 (telephone), 173.22 (the shipper classifies).
 */
export function missingForPapers({ emergencyTelephone, lines }: PapersReadiness): MissingForPapers[] {
  const isAsked = lines.some(({ description }) => isHazardous(description) || description.needsChoice)
  return [
    ...isAsked && !emergencyTelephone?.trim()
      ? [{
          code: 'emergency-telephone' as const, cylinderId: null, source: '49 CFR 172.604',
          text: 'No emergency telephone is set. Someone has to answer it while the load is on its way, and know it or reach at once who does.',
        }]
      : [],
    ...unclassified(lines).map(({ cylinderId, description }) => ({
      code: 'not-classified' as const, cylinderId, source: '49 CFR 173.22',
      text: `Not classified: ${description.because}`,
    })),
  ]
}
