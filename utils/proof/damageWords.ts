/** Where verifying found something; what does not apply is null. */
interface Where { kind: string, cylinderId: string | null, version: number | null, seq: number | null, checkpoint: number | null }

/** What a finding of verifying is about, as the beginning of a sentence. A cylinder stands apart, for it leads to its page. */
export function damageSubject({ kind, cylinderId, version, seq, checkpoint }: Where): string {
  if (checkpoint !== null) return `Checkpoint ${checkpoint}`
  if (kind === 'missing-number' && seq !== null) return `From number ${seq} on`
  if (version !== null) return `Version ${version}${seq === null ? '' : `, number ${seq}`}`
  return cylinderId === null ? 'The log' : 'The cylinder'
}
