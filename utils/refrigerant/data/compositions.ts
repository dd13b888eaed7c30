import type { Composition } from '../types'

const BLEND_LIST = 'blend list in the public reporting data of the Ozone Secretariat (2021)'
const DESIGNATION_LIST = 'ANSI/ASHRAE Standard 34, as two public restatements of its list of blends give it'

/** Blends whose composition is published and whose properties are not held. In mass percent. */
export const COMPOSITIONS: readonly Composition[] = [
  blend('R-401B', { 'R-22': 61, 'R-152a': 11, 'R-124': 28 }, BLEND_LIST),
  blend('R-401C', { 'R-22': 33, 'R-152a': 15, 'R-124': 52 }, DESIGNATION_LIST),
  blend('R-402B', { 'R-125': 38, 'R-290': 2, 'R-22': 60 }, BLEND_LIST),
  blend('R-406A', { 'R-22': 55, 'R-600a': 4, 'R-142b': 41 }, BLEND_LIST),
  blend('R-407B', { 'R-32': 10, 'R-125': 70, 'R-134a': 20 }, BLEND_LIST),
  blend('R-407D', { 'R-32': 15, 'R-125': 15, 'R-134a': 70 }, BLEND_LIST),
  blend('R-407E', { 'R-32': 25, 'R-125': 15, 'R-134a': 60 }, BLEND_LIST),
  blend('R-407H', { 'R-32': 32.5, 'R-125': 15, 'R-134a': 52.5 }, BLEND_LIST),
  blend('R-410B', { 'R-32': 45, 'R-125': 55 }, BLEND_LIST),
  blend('R-422C', { 'R-125': 82, 'R-134a': 15, 'R-600a': 3 }, BLEND_LIST),
  blend('R-442A', { 'R-32': 31, 'R-125': 31, 'R-134a': 30, 'R-152a': 3, 'R-227ea': 5 }, BLEND_LIST),
]

function blend(designation: string, massPercent: Readonly<Record<string, number>>, source: string): Composition {
  return {
    designation,
    components: Object.entries(massPercent).map(([component, percent]) => ({ component, massPercent: percent })),
    source,
  }
}
