import { queryText, withoutEmpty } from '../address/queryText'
import type { ProblemError } from '../contract/problem'
import type { CylinderView } from '../custody/cylinderView'
import { parseFigure } from '../quantity/figure'
import { formatReading, massText, parseMassText, readingGrams, type MassUnit } from '../quantity/mass'

/** One component of a blend as it is typed. */
export type ComponentDraft = { component: string, percent: string }

/** What is typed to compare the fill rules: texts, so that nothing is lost that cannot be read yet. */
export type CompareDraft = {
  refrigerant: string
  /** The composition in place of a refrigerant's name; empty while it is not asked by composition. */
  composition: ComponentDraft[]
  spec: string
  servicePressurePsig: string
  waterCapacity: string
  tareWeight: string
  gross: string
  condition: string
  flammableMarked: boolean
  share: string
}

/** What the address may hold, in its order. */
export const COMPARE_KEYS = [
  'refrigerant', 'composition', 'spec', 'servicePressurePsig', 'waterCapacity', 'tareWeight', 'gross', 'condition', 'flammableMarked', 'share',
] as const
export type CompareKey = (typeof COMPARE_KEYS)[number]
export type CompareQuery = Partial<Record<CompareKey, string>>

/** The fields of an address, whatever they hold. */
export function compareDraft(query: Record<string, unknown>): CompareDraft {
  const text = (key: CompareKey) => queryText(query, key)
  return {
    refrigerant: text('refrigerant'),
    composition: componentsOf(text('composition')),
    spec: text('spec'),
    servicePressurePsig: text('servicePressurePsig'),
    waterCapacity: text('waterCapacity'),
    tareWeight: text('tareWeight'),
    gross: text('gross'),
    condition: text('condition') || 'clean',
    flammableMarked: text('flammableMarked') === 'true',
    share: text('share'),
  }
}

/** What is still missing before anything can be asked, by field. */
export function compareFaults({ refrigerant, composition, spec, waterCapacity }: CompareQuery): ProblemError[] {
  return [
    ...refrigerant || composition ? [] : [{ path: 'refrigerant', message: 'Choose a refrigerant, or give a composition.' }],
    ...spec ? [] : [{ path: 'spec', message: 'Needed, as stamped: DOT-4BA400.' }],
    ...waterCapacity ? [] : [{ path: 'waterCapacity', message: 'Needed: every rule is reckoned from it.' }],
  ]
}

/**
 * The address of what is typed, which is also what is asked of the server. A weight without a unit is in the reader's.
 *
 * Shape: only what holds something; what cannot be read goes along as it is, to be named by the server.
 */
export function compareQuery(draft: CompareDraft, unit: MassUnit): CompareQuery {
  const composition = draft.composition.filter(({ component, percent }) => component.trim() || percent.trim())
    .map(({ component, percent }) => percent.trim() ? `${component.trim()}:${percent.trim()}` : component.trim()).join(',')
  const query: CompareQuery = {
    refrigerant: composition ? '' : draft.refrigerant.trim(),
    composition,
    spec: draft.spec.trim(),
    servicePressurePsig: draft.servicePressurePsig.trim(),
    waterCapacity: massForAddress(draft.waterCapacity, unit),
    tareWeight: massForAddress(draft.tareWeight, unit),
    gross: massForAddress(draft.gross, unit),
    condition: draft.condition === 'clean' ? '' : draft.condition,
    flammableMarked: draft.flammableMarked ? 'true' : '',
    share: draft.share.trim(),
  }
  return withoutEmpty(query)
}

/**
 * A weight as the address holds it: without spaces, with its unit.
 *
 * @example massForAddress('47,7', 'lb') // '47.7lb'
 */
export function massForAddress(typed: string, unit: MassUnit): string {
  const figure = parseFigure(typed)
  if ('value' in figure) return `${figure.value}${unit === 'kg' ? 'kg' : 'lb'}`
  return typed.replace(/\s+/g, '').toLowerCase()
}

function componentsOf(text: string): ComponentDraft[] {
  if (text.trim() === '') return []
  return text.split(',').map((part) => {
    const cut = part.lastIndexOf(':')
    return cut === -1 ? { component: part, percent: '' } : { component: part.slice(0, cut), percent: part.slice(cut + 1) }
  })
}

/**
 * The stamp that was asked about, in one line above its answer: as it was typed, never converted.
 *
 * @example stampAsked({ spec: 'DOT-4BA400', waterCapacity: '47.7lb' }) // 'DOT-4BA400, WC 47.7 lb, TW not given, not marked for flammables'
 */
export function stampAsked(query: CompareQuery): string {
  const mass = (text: string) => {
    const reading = parseMassText(text)
    return reading === null ? text : formatReading(reading)
  }
  return [
    query.spec,
    query.servicePressurePsig && `${query.servicePressurePsig}\u00A0psig`,
    query.waterCapacity && `WC\u00A0${mass(query.waterCapacity)}`,
    query.tareWeight ? `TW\u00A0${mass(query.tareWeight)}` : 'TW not given',
    query.gross && `gross\u00A0${mass(query.gross)}`,
    query.condition,
    query.share && `share\u00A0${query.share}`,
    query.flammableMarked === 'true' ? 'marked for flammables' : 'not marked for flammables',
  ].filter(Boolean).join(', ')
}

/** Where the rules are compared for the stamp of a cylinder and for what is, or is to go, in it. */
export function compareAddress({ stamp, contents, capacity }: Pick<CylinderView, 'stamp' | 'contents' | 'capacity'>): { path: string, query: CompareQuery } {
  const query: CompareQuery = {
    refrigerant: capacity.forRefrigerant ?? '',
    spec: stamp?.spec ?? '',
    servicePressurePsig: stamp?.servicePressurePsig === null || stamp === null ? '' : String(stamp.servicePressurePsig),
    waterCapacity: stamp?.waterCapacity ? massText(stamp.waterCapacity) : '',
    tareWeight: tareText(stamp),
    gross: grossText(stamp, contents),
    condition: contents.nothingInIt || contents.condition === 'clean' ? '' : contents.condition,
    flammableMarked: stamp?.flammableMarked ? 'true' : '',
  }
  return { path: '/fill-limit', query: withoutEmpty(query) }
}

// The stamp as it was read, but the tare that a retest set where there is one.
function tareText(stamp: CylinderView['stamp']): string {
  if (stamp === null || stamp.tareWeightGrams === null) return ''
  return stamp.tareWeight && readingGrams(stamp.tareWeight) === stamp.tareWeightGrams ? massText(stamp.tareWeight) : inKilograms(stamp.tareWeightGrams)
}

function grossText(stamp: CylinderView['stamp'], { nothingInIt, netGrams }: CylinderView['contents']): string {
  const tareGrams = stamp?.tareWeightGrams ?? null
  return nothingInIt || tareGrams === null || netGrams === null ? '' : inKilograms(tareGrams + netGrams)
}

function inKilograms(grams: number): string {
  return massText({ unit: 'kg', value: grams / 1000 })
}
