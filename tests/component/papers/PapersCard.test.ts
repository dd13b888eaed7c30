import { mountSuspended } from '@nuxt/test-utils/runtime'
import { describe, expect, it } from 'vitest'
import PapersCard from '~~/components/papers/PapersCard.vue'
import { madePapers, papersLine } from '~~/tests/helpers/shipmentPapers'
import type { PapersInput, PapersLine } from '~~/utils/transport/shippingPapers'

const mixed = (given: Partial<PapersLine> = {}) => papersLine({ cylinderId: 'm', contents: { refrigerant: null, condition: 'mixed', knownParts: ['R-22', 'R-134a'], nothingInIt: false }, ...given })
const shown = (lines: PapersLine[], { isDraft = true, ...given }: Partial<PapersInput> & { isDraft?: boolean } = {}) => mountSuspended(PapersCard, {
  props: { shipmentId: 's', papers: madePapers(lines, given), isDraft, mayClassify: true, mailTo: 'dock@tarnbeck.example' },
})
const textOf = (card: Awaited<ReturnType<typeof shown>>) => card.text().replaceAll('\u00A0', ' ')

describe('what the papers say', () => {
  it('shows descriptions with packages and gross, totals, placard and materials of trade', async () => {
    const text = textOf(await shown([papersLine(), papersLine({ cylinderId: 'b' })]))
    expect(text).toContain('UN1018, Refrigerant gas R 22, 2.2')
    expect(text).toContain('2 cyl., 88.6 lb gross')
    expect(text).toContain('No placard for this load by itself')
    expect(text).toContain('Not as materials of trade')
    expect(text).toContain('given to a carrier')
    expect(text).toContain('A draft')
  })

  it('says what is missing before it may leave', async () => {
    expect(textOf(await shown([papersLine()], { emergency: { telephone: null, contract: null } }))).toContain('No emergency telephone is set.')
    expect(textOf(await shown([papersLine()]))).not.toContain('No emergency telephone')
  })

  it('says of a blend without a row that the choice of its entry is from memory', async () => {
    expect(textOf(await shown([papersLine({ contents: { refrigerant: 'R-410A', condition: 'clean', knownParts: ['R-410A'], nothingInIt: false } })]))).toContain('Choice of entry from memory')
  })

  it('asks the shipper how mixed refrigerants travel, and takes the confirmation of what is proposed', async () => {
    const card = await shown([mixed()])
    expect(textOf(card)).toContain('may not leave before its shipper says how it travels')
    await card.get('form').trigger('submit')
    expect(card.emitted('classify')).toEqual([['m', { identification: 'UN1078', technicalNames: ['chlorodifluoromethane', '1,1,1,2-tetrafluoroethane'], reason: null }]])
  })

  it('wants a reason for another choice than is proposed', async () => {
    const card = await shown([mixed()])
    await card.get('select').setValue('UN3161')
    await card.get('form').trigger('submit')
    expect(card.text()).toContain('Say why.')
    expect(card.emitted('classify')).toBeUndefined()
    await card.get('input[maxlength="200"]').setValue('an analysis found R-32')
    await card.get('form').trigger('submit')
    expect(card.emitted('classify')?.[0]).toEqual(['m', expect.objectContaining({ identification: 'UN3161', reason: 'an analysis found R-32' })])
  })

  it('lets the shipper describe a cylinder otherwise than the table names it, for a reason', async () => {
    const card = await shown([papersLine()])
    await card.get('select').setValue(papersLine().cylinderId)
    const form = card.get('form')
    expect(form.get('button').text()).toBe('Say it travels so')
    await form.get('select').setValue('UN1078')
    await form.findAll('input')[0]!.setValue('chlorodifluoromethane, air')
    await form.get('input[maxlength="200"]').setValue('air in it')
    await form.trigger('submit')
    expect(card.emitted('classify')).toEqual([[papersLine().cylinderId, { identification: 'UN1078', technicalNames: ['chlorodifluoromethane', 'air'], reason: 'air in it' }]])
  })

  it('shows what the shipper said, to be taken back until it leaves', async () => {
    const line = mixed({ classification: { identification: 'UN1078', technicalNames: ['chlorodifluoromethane'], reason: 'as analysed' } })
    const card = await shown([line])
    expect(card.text()).toContain('The shipper’s judgement: as analysed')
    await card.findAll('button').find(button => button.text() === 'Take it back')!.trigger('click')
    expect(card.emitted('classify')).toEqual([['m', null]])
    expect((await shown([line], { isDraft: false })).text()).not.toContain('Take it back')
  })

  it('mails the papers once it has left, to the reclaimer or to an address typed', async () => {
    expect((await shown([papersLine()])).find('input[type="email"]').exists()).toBe(false)
    const card = await shown([papersLine()], { isDraft: false })
    expect(card.text()).toContain('As it left.')
    await card.get('form').trigger('submit')
    await card.get('input[type="email"]').setValue('other@tarnbeck.example')
    await card.get('form').trigger('submit')
    expect(card.emitted('mail')).toEqual([[{}], [{ to: 'other@tarnbeck.example' }]])
  })
})
