import { mountSuspended } from '@nuxt/test-utils/runtime'
import { describe, expect, it } from 'vitest'
import { nextTick } from 'vue'
import PersonForm from '~~/components/person/PersonForm.vue'
import type { PersonLine } from '~~/utils/contract/people'
import { allByRole, byRole } from '../../helpers/roles'

function person(id: string, name: string, changes: Partial<PersonLine> = {}): PersonLine {
  return {
    id, name, email: null, roles: ['technician'], trainee: false, certification: null, certificationType: null, certificationNumber: null,
    supervisor: null, vans: [], active: true, invited: false, ...changes,
  }
}
const DAN = person('dan', 'Dan Ekwall', { certificationType: 'universal' })
const EVE = person('eve', 'Eve Brandt')
const PIA = person('pia', 'Pia Sundt', { trainee: true, supervisor: { id: 'dan', name: 'Dan Ekwall' } })
const VANS = [
  { id: 'v5', name: 'Van 05', technicianId: null, technicianName: null },
  { id: 'v8', name: 'Van 08', technicianId: 'dan', technicianName: 'Dan Ekwall' },
]

async function open(shown: PersonLine | null) {
  const form = await mountSuspended(PersonForm, { props: { person: shown, people: [DAN, EVE, PIA], vans: VANS } })
  const select = (name: string) => byRole(form.element, 'combobox', name) as HTMLSelectElement
  const field = (name: string) => byRole(form.element, 'textbox', name) as HTMLInputElement
  return {
    form, select, field,
    words: (name: string) => [...select(name).options].map(option => option.text),
    async choose(name: string, value: string) {
      select(name).value = value
      select(name).dispatchEvent(new Event('change'))
      await nextTick()
    },
    async type(name: string, text: string) {
      field(name).value = text
      field(name).dispatchEvent(new Event('input'))
      await nextTick()
    },
    async save() {
      await form.find('form').trigger('submit')
      return form.emitted<[Record<string, unknown>]>('save')?.at(-1)?.[0]
    },
  }
}

describe('a person\'s form', () => {
  it('takes a certification by type and number, and asks for no number without a type', async () => {
    const { form, choose, type, save } = await open(EVE)
    expect(allByRole(form.element, 'textbox', /^Number/)).toHaveLength(0)
    await choose('Type', 'II')
    await type('Number, if known', ' 4411 ')
    expect(await save()).toMatchObject({ certificationType: 'II', certificationNumber: '4411', certification: null })
    await choose('Type', '')
    expect(await save()).toMatchObject({ certificationType: null, certificationNumber: null })
  })

  it('offers a trainee those who may supervise, and nobody else a supervisor', async () => {
    const trainee = await open(PIA)
    expect(trainee.words('Usual supervisor')).toEqual(['Nobody in particular', 'Dan Ekwall'])
    expect(trainee.select('Usual supervisor').value).toBe('dan')
    expect(await trainee.save()).not.toHaveProperty('supervisorId')
    await trainee.choose('Usual supervisor', '')
    expect(await trainee.save()).toMatchObject({ supervisorId: null })
    const { form } = await open(EVE)
    expect(allByRole(form.element, 'combobox', /supervisor/)).toHaveLength(0)
  })

  it('keeps in sight who supervised and may no longer', async () => {
    const { words } = await open({ ...PIA, supervisor: { id: 'eve', name: 'Eve Brandt' } })
    expect(words('Usual supervisor')).toContain('Eve Brandt, may not supervise any more')
  })

  it('says who has a van now, and sends one only where it was chosen', async () => {
    const { words, choose, save } = await open(EVE)
    expect(words('Van')).toEqual(['No van', 'Van 05', 'Van 08, Dan Ekwall has it now'])
    expect(await save()).not.toHaveProperty('vanId')
    await choose('Van', 'v8')
    expect(await save()).toMatchObject({ vanId: 'v8' })
  })

  it('gives the van back where none is chosen', async () => {
    const { choose, save } = await open({ ...DAN, vans: [{ id: 'v8', name: 'Van 08' }] })
    await choose('Van', '')
    expect(await save()).toMatchObject({ vanId: null })
  })
})
