import type { Certification } from '../../../utils/access/certification'
import type { Access, Role } from '../../../utils/access/roles'
import type { MassUnit } from '../../../utils/quantity/mass'
import type { ScaleStep } from '../../../utils/quantity/scale'
import { DAY } from './calendar'
import { seededRandom, type Random } from './random'

// Everybody and every firm here is invented.

/** The password of everybody in the demo. */
export const DEMO_PASSWORD = 'demo-cylinders-2026'
/** Where the demo firm is. */
export const DEMO_TIME_ZONE = 'America/Chicago'
/** The demo firm itself. */
export const DEMO_FIRM = {
  name: 'Ferrowick Refrigeration', telephone: '(555) 010-0142', timeZone: DEMO_TIME_ZONE, units: 'lb' as MassUnit,
  address: '200 Millrace Street', emergencyTelephone: '(555) 010-0199', emergencyContract: 'Ferrowick Refrigeration, contract 555-7741',
}

const SCALES_SEED = 20_261_202
const LATER_FIRMS_SEED = 20_261_212

/** Somebody of the demo firm. */
export interface DemoPerson extends Certification {
  id: string
  email: string
  name: string
  roles: Role[]
  trainee: boolean
  supervisorId: string | null
  /** How this person reads a scale. */
  reads: MassUnit
}

/** A place of the demo firm, or the one that stands for another firm. */
export interface DemoPlace { id: string, name: string, kind: 'shop' | 'rack' | 'van' | 'site' | 'firm', parentId?: string, firmId?: string, technicianId?: string }
/** A firm that the demo firm deals with. */
export interface DemoFirm { id: string, name: string, kind: 'reclaimer' | 'requalifier' | 'supplier' | 'customer' | 'carrier', telephone: string, email: string, address: string, rin?: string }

/** A scale of the demo firm. */
export interface DemoScale { id: string, name: string, accuracyEntered: ScaleStep, accuracyPercent: number, lastCheckOn: string | null }

/** Everybody and everything that the story of the demo firm names. */
export interface Cast {
  people: Record<'warehouse' | 'technician' | 'second' | 'third' | 'manager' | 'auditor' | 'admin' | 'trainee', DemoPerson>
  shops: [DemoPlace, DemoPlace]
  racks: DemoPlace[]
  vans: DemoPlace[]
  sites: DemoPlace[]
  scales: Record<'shop' | 'south' | 'dock', DemoScale>
  firms: Record<'reclaimer' | 'otherReclaimer' | 'thirdReclaimer' | 'requalifier' | 'supplier' | 'carrier' | 'dairy' | 'store', DemoFirm>
  placeOf: (firm: DemoFirm) => DemoPlace
  firmPlaces: DemoPlace[]
}

/** The people, places and firms of the demo. */
export function castOf(random: Random, startAt: number): Cast {
  const id = () => random.uuid(startAt)
  const person = (email: string, name: string, roles: Role[], reads: MassUnit, more: Partial<DemoPerson> = {}): DemoPerson => ({
    id: id(), email: `${email}@demo.example`, name, roles, trainee: false, supervisorId: null,
    certificationType: null, certificationNumber: null, certification: null, reads, ...more,
  })
  const technician = person('technician', 'Dayo Okafor', ['technician'], 'lb-oz', { certificationType: 'universal', certificationNumber: '555-20417' })
  const people: Cast['people'] = {
    warehouse: person('warehouse', 'Walt Hadley', ['warehouse'], 'lb'),
    technician,
    second: person('technician2', 'Ines Vauclair', ['technician'], 'lb', { certificationType: 'II', certificationNumber: '555-31882' }),
    // An old card, written down before types and numbers were asked for.
    third: person('technician3', 'Tobias Renn', ['technician'], 'kg', { certification: 'Universal, card of 2009' }),
    manager: person('manager', 'Maren Sorrel', ['manager'], 'lb', { certificationType: 'universal', certificationNumber: '555-10006' }),
    auditor: person('auditor', 'Ruth Amberly', ['auditor'], 'lb'),
    admin: person('admin', 'Kit Osgood', ['admin'], 'lb'),
    trainee: person('trainee', 'Pia Lindmark', ['technician'], 'lb', { trainee: true, supervisorId: technician.id }),
  }
  // Of their own, so that the story stays as it is whatever firms there are besides.
  const later = seededRandom(LATER_FIRMS_SEED)
  const firm = (name: string, kind: DemoFirm['kind'], address: string, rin?: string, from: Random = random): DemoFirm => {
    const mailbox = name.toLowerCase().replace(/[^a-z]+/g, '-')
    return { id: from.uuid(startAt), name, kind, address, telephone: `(555) 010-0${from.whole(200, 899)}`, email: `dock@${mailbox}.example`, rin }
  }
  const first = {
    reclaimer: firm('Halvern Reclaim', 'reclaimer', '4 Foundry Row'),
    otherReclaimer: firm('Brindmoor Gas Recovery', 'reclaimer', '118 Canal Street'),
    requalifier: firm('Oxbow Cylinder Testing', 'requalifier', '27 Kiln Lane', 'Z987'),
    supplier: firm('Pellworth Supply', 'supplier', '9 Market Yard'),
    dairy: firm('Dunmarrow Dairy', 'customer', '1 Creamery Road'),
    store: firm('Wexley Cold Store', 'customer', '60 Harbour Way'),
  }
  const firms: Cast['firms'] = {
    ...first,
    thirdReclaimer: firm('Tressick Reclaim', 'reclaimer', '31 Tannery Road', undefined, later),
    carrier: firm('Morrowby Haulage', 'carrier', '12 Depot Lane', undefined, later),
  }
  const place = (name: string, kind: DemoPlace['kind'], more: Partial<DemoPlace> = {}): DemoPlace => ({ id: id(), name, kind, ...more })
  const shops: Cast['shops'] = [place('North shop', 'shop'), place('South shop', 'shop')]
  const racks = [
    place('North shop, bay 1', 'rack', { parentId: shops[0].id }), place('North shop, bay 2', 'rack', { parentId: shops[0].id }),
    place('North shop, set-apart rack', 'rack', { parentId: shops[0].id }), place('South shop, cage', 'rack', { parentId: shops[1].id }),
  ]
  const drivers = [people.technician, people.second, people.third, people.trainee]
  const vans = Array.from({ length: 6 }, (_, index) => place(`Van ${String(index * 3 + 2).padStart(2, '0')}`, 'van', { technicianId: drivers[index]?.id }))
  const firmPlaces = Object.values(firms).map((one): DemoPlace =>
    ({ id: (Object.values(first).includes(one) ? random : later).uuid(startAt), name: one.name, kind: 'firm', firmId: one.id }))
  return {
    people, shops, racks, vans, firms, firmPlaces, scales: scalesOf(startAt),
    sites: [place('Creamery plant room', 'site'), place('Harbour cold store, roof', 'site')],
    placeOf: one => firmPlaces.find(spot => spot.firmId === one.id)!,
  }
}

/** One scale checked lately, one over a year before the story's end, one of which nobody knows. */
function scalesOf(startAt: number): Cast['scales'] {
  // Of their own, so that the story stays as it is whatever scales there are.
  const { uuid } = seededRandom(SCALES_SEED)
  const day = (days: number) => new Date(startAt + days * DAY).toISOString().slice(0, 10)
  return {
    shop: { id: uuid(startAt), name: 'North shop scale', accuracyEntered: { unit: 'oz', value: 0.5 }, accuracyPercent: 0.25, lastCheckOn: day(500) },
    south: { id: uuid(startAt), name: 'South shop scale', accuracyEntered: { unit: 'oz', value: 1 }, accuracyPercent: 0.5, lastCheckOn: day(150) },
    dock: { id: uuid(startAt), name: 'Dock platform', accuracyEntered: { unit: 'lb', value: 0.2 }, accuracyPercent: 0, lastCheckOn: null },
  }
}

/** How a person of the cast appears to permissions. */
export function demoAccess(person: DemoPerson): Access {
  return { personId: person.id, roles: person.roles, trainee: person.trainee }
}
