/** What the shipper signs, and whether this load asks for it. */
export interface Certification { text: string, isAsked: boolean, because: string, source: string }

/** Source: 49 CFR 172.204(a)(1). */
const STATEMENT = 'This is to certify that the above-named materials are properly classified, described, packaged, marked and labeled, '
  + 'and are in proper condition for transportation according to the applicable regulations of the Department of Transportation.'

/** The shipper's certification. It is always printed; on the firm's own vehicle it need not be signed. Source: 49 CFR 172.204(a)(1), (b)(1), (d). */
export function certification(isOwnVehicle: boolean): Certification {
  return {
    text: STATEMENT,
    isAsked: !isOwnVehicle,
    because: isOwnVehicle
      ? 'Not asked for where the shipper carries it as a private carrier, unless it is reshipped or passed to another carrier, or is a hazardous waste (49 CFR 172.204(b)(1)).'
      : 'Signed legibly by a principal, officer, partner or employee of the shipper, or its agent (49 CFR 172.204(d)).',
    source: '49 CFR 172.204(a)(1)',
  }
}
