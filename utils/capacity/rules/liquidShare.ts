import { hasLiquidAt, liquidDensityAt } from '../../refrigerant/saturation'
import type { RuleFigure, RuleInput } from './ruleInput'
import { densityText, litresText, shareText } from './sumText'

/** A share of the volume as liquid at a temperature: what the rules that fix such a temperature have in common. */
export type LiquidShare = {
  shareThousandths: number
  tC: number
  /** The temperature as the trade writes it. */
  temperature: string
  source: string
}

/** The weight of liquid that takes a share of a cylinder's volume at a temperature, or none where there is no liquid then. */
export function liquidShareOfVolume(input: RuleInput, share: LiquidShare): RuleFigure {
  const { refrigerant, volumeLitres } = input
  if (!hasLiquidAt(refrigerant, share.tC)) {
    return {
      exactGrams: null,
      because: `${refrigerant.designation} has no liquid at ${share.temperature}, or no figure for it`,
      source: share.source,
    }
  }
  const density = liquidDensityAt(refrigerant, share.tC)
  return {
    exactGrams: volumeLitres * density * share.shareThousandths / 1000,
    sum: `${shareText(share.shareThousandths)} × ${litresText(volumeLitres)} × ${densityText(density)} `
      + `(liquid ${refrigerant.designation} at ${share.temperature})`,
    source: `${share.source}; density: ${refrigerant.source}`,
  }
}
