import { headlineGwp, type GwpBasis } from './gwp'
import { pressureClassOf, type PressureClass } from './pressureClass'
import { isFlammable, isToxic } from './safety'
import type { Catalogue, Composition, Refrigerant } from './types'

/** A GWP that stands for a refrigerant where there is room for one, with the list it is from. */
type HeadlineGwp = { basis: GwpBasis, value: number } | null

/** A refrigerant of the catalogue in a list. */
export interface RefrigerantLine {
  designation: string
  kind: string
  safetyClass: string | null
  accuracyGroup: string
  flammable: boolean
  toxic: boolean
  pressureClass: PressureClass
  gwp: HeadlineGwp
}

/** A blend of which the composition is published and no property is held. */
export interface CompositionLine { designation: string, composition: Refrigerant['composition'], gwp: HeadlineGwp }

/** Every refrigerant of the catalogue in its order, and the blends of which only the composition is known. */
export function catalogueLines({ refrigerants, compositions }: Catalogue): { items: RefrigerantLine[], compositions: CompositionLine[] } {
  return { items: [...refrigerants.values()].map(refrigerantLine), compositions: [...compositions.values()].map(compositionLine) }
}

function refrigerantLine(refrigerant: Refrigerant): RefrigerantLine {
  const { designation, kind, safetyClass, accuracyGroup } = refrigerant
  return {
    designation, kind, safetyClass, accuracyGroup, flammable: isFlammable(safetyClass), toxic: isToxic(safetyClass),
    pressureClass: pressureClassOf(refrigerant).pressureClass, gwp: headlineGwp(refrigerant),
  }
}

function compositionLine({ designation, components }: Composition): CompositionLine {
  return { designation, composition: [...components], gwp: headlineGwp({ composition: [...components] }) }
}
