import { mountSuspended } from '@nuxt/test-utils/runtime'
import { describe, expect, it } from 'vitest'
import SettlementEntry from '~~/components/settlement/SettlementEntry.vue'
import { byRole } from '../../helpers/roles'
import { settlementLine } from '../../helpers/settlementLine'

const LINES = [settlementLine('a'), settlementLine('b'), settlementLine('c')]

async function entry(lines = LINES) {
  const form = await mountSuspended(SettlementEntry, { props: { lines, unit: 'lb' as const, isSettled: false }, attachTo: document.body })
  const box = (name: string) => form.find<HTMLInputElement>(`[aria-label="${name}"]`)
  return { form, box, save: () => form.get('form').trigger('submit') }
}

function pasting(text: string): Event {
  return Object.assign(new Event('paste', { bubbles: true, cancelable: true }), { clipboardData: { getData: () => text } })
}

describe('entering a settlement', () => {
  it('saves only the lines that were typed in, as they were typed', async () => {
    const { form, box, save } = await entry()
    await box('Their gross of serial S-b').setValue('39.9')
    await box('Accepted net of serial S-b').setValue('12')
    await box('Price of serial S-b').setValue('2.4')
    await box('What became of serial S-b').setValue('taken-over')
    expect(form.text()).toContain('$28.80')
    expect(form.text()).toContain('net −0.5\u00A0lb')
    await save()
    expect(form.emitted('save')).toEqual([[[{
      cylinderId: 'b', theirGross: { unit: 'lb', value: 39.9 }, acceptedNet: { unit: 'lb', value: 12 }, grade: null, rate: { mills: 2_400, per: 'lb' }, statedCents: null, outcome: 'taken-over',
    }]]])
  })

  it('takes a block from a spreadsheet rightwards and down, and no further than there are lines', async () => {
    const { form, box, save } = await entry()
    box('Accepted net of serial S-b').element.dispatchEvent(pasting('12\tA\t2.40\r\n11.5\tB\t-1\r\n9\tX\t1\r\n'))
    await save()
    const [lines] = form.emitted('save')![0] as [{ cylinderId: string, grade: string, rate: object }[]]
    expect(lines.map(line => [line.cylinderId, line.grade, line.rate])).toEqual([['b', 'A', { mills: 2_400, per: 'lb' }], ['c', 'B', { mills: -1_000, per: 'lb' }]])
  })

  it('saves nothing while a box cannot be read, and says which', async () => {
    const { form, box, save } = await entry()
    await box('Their gross of serial S-a').setValue('1,022')
    await save()
    expect(form.emitted('save')).toBeUndefined()
    expect(box('Their gross of serial S-a').attributes('aria-invalid')).toBe('true')
    expect(byRole(form.element.parentElement!, 'alert').textContent).toContain('Nothing was saved')
  })

  it('goes down a column by Enter, and saves nothing by it', async () => {
    const { form, box } = await entry()
    box('Grade of serial S-a').element.focus()
    await box('Grade of serial S-a').trigger('keydown', { key: 'Enter' })
    expect(document.activeElement).toBe(box('Grade of serial S-b').element)
    expect(form.emitted('save')).toBeUndefined()
  })

  it('keeps what is being typed where other lines come anew from the server', async () => {
    const { form, box } = await entry()
    await box('Grade of serial S-a').setValue('A')
    await form.setProps({ lines: [LINES[0]!, settlementLine('b', { grade: 'B' }), LINES[2]!] })
    expect([box('Grade of serial S-a').element.value, box('Grade of serial S-b').element.value]).toEqual(['A', 'B'])
  })

  it('keeps what a typed weight says where the unit of the screen is changed', async () => {
    const { form, box, save } = await entry()
    await box('Accepted net of serial S-a').setValue('12')
    await form.setProps({ unit: 'kg' })
    expect(box('Accepted net of serial S-a').element.value).toBe('12 lb')
    await save()
    expect(form.emitted('save')).toMatchObject([[[{ cylinderId: 'a', acceptedNet: { unit: 'lb', value: 12 } }]]])
  })

  it('asks no more what became of a line that is back, or of any once it is settled', async () => {
    const { form, box } = await entry([settlementLine('a', { outcome: 'sent-back' }, { returnedAt: '2026-03-02T10:00:00Z' }), settlementLine('b')])
    expect(box('What became of serial S-a').exists()).toBe(false)
    expect(box('What became of serial S-b').exists()).toBe(true)
    await form.setProps({ isSettled: true })
    expect(box('What became of serial S-b').exists()).toBe(false)
  })
})
