import { isPoisonous, type LoadedLine } from './placards'

/** A relief that the regulation gives, with what it hangs on. The papers never take it by themselves. */
export interface Relief { cylinders: number, text: string, conditions: string, source: string }

/**
 * What the regulation eases for cylinders that only hold a residue.
 *
 * Source: 49 CFR 173.29(b), (c)(2), 172.203(e)(1). Units: pressure as the regulation has it.
 */
export function residueReliefs(lines: readonly LoadedLine[]): Relief[] {
  const residue = lines.filter(line => line.isResidue && line.description.identification !== null && !isPoisonous(line))
  // Ammonia, which 173.29(b) leaves out, is among what poisons.
  const unburning = residue.filter(({ description }) => description.division === '2.2')
  return [
    ...residue.length > 0
      ? [{
          cylinders: residue.length,
          text: 'No shipping paper is asked for.',
          conditions: 'Where a private or a contract carrier collects them for reconditioning, remanufacture or reuse. It is printed all the same.',
          source: '49 CFR 173.29(c)(2)',
        }]
      : [],
    ...unburning.length > 0
      ? [{
          cylinders: unburning.length,
          text: 'Not regulated at all.',
          conditions: 'Where the gauge shows under 200 kPa (29.0 psig) at 20 °C (68 °F), it is no hazardous substance, waste or marine pollutant, and the hazard marks and labels are taken off or covered; these may stay where nobody sees them in a vehicle that the shipper loads, and shipper or consignee unloads.',
          source: '49 CFR 173.29(b)',
        }]
      : [],
  ]
}
