const MB = 1_000_000

/**
 * How much of its space an application takes up on a device; null where the browser tells nothing.
 *
 * Units: bytes in, megabytes of a million bytes out, one digit after the point below ten.
 * @example storedText({ usedBytes: 3_140_000, quotaBytes: 2_000_000_000 }) // '3.1 of 2,000 MB'
 */
export function storedText({ usedBytes, quotaBytes }: { usedBytes: number | null, quotaBytes: number | null }): string | null {
  if (usedBytes === null) return null
  return quotaBytes === null ? `${megabytes(usedBytes)} MB` : `${megabytes(usedBytes)} of ${megabytes(quotaBytes)} MB`
}

function megabytes(bytes: number): string {
  const figure = bytes / MB
  return figure.toLocaleString('en-US', { maximumFractionDigits: figure < 10 ? 1 : 0 })
}
