/** The types of technician certification. Source: 40 CFR 82.161(a), from memory. */
export const CERTIFICATION_TYPES = ['I', 'II', 'III', 'universal'] as const

export type CertificationType = (typeof CERTIFICATION_TYPES)[number]

/** What is on record of a person's certification. */
export interface Certification {
  certificationType: CertificationType | null
  /** As the card has it. */
  certificationNumber: string | null
  /** What is written beside type and number, or instead of them. */
  certification: string | null
}

/** Each type as people read it, and what its holder may open. Source: 40 CFR 82.161(a), from memory. */
export const CERTIFICATION_WORDS: Record<CertificationType, { name: string, covers: string }> = {
  I: { name: 'Type I', covers: 'small appliances' },
  II: { name: 'Type II', covers: 'medium, high and very high pressure' },
  III: { name: 'Type III', covers: 'low pressure' },
  universal: { name: 'Universal', covers: 'all appliances' },
}

/**
 * A certification in a line; null where none is on record.
 *
 * @example certificationWords({ certificationType: 'II', certificationNumber: '4411', certification: null }) // 'Type II, no. 4411'
 */
export function certificationWords({ certificationType, certificationNumber, certification }: Certification): string | null {
  const parts = [
    certificationType && CERTIFICATION_WORDS[certificationType].name,
    certificationNumber && `no. ${certificationNumber}`,
    certification,
  ]
  return parts.filter(Boolean).join(', ') || null
}

/** Whether a certification is on record, by its type or as it was written down before types were asked for. */
export function isCertified({ certificationType, certification }: Pick<Certification, 'certificationType' | 'certification'>): boolean {
  return certificationType !== null || certification !== null
}
