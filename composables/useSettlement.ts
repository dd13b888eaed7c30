import { useApi } from '~~/composables/useApi'
import { useAttempt } from '~~/composables/useAttempt'
import { useEventIds } from '~~/composables/useEventIds'
import { useLoaded } from '~~/composables/useLoaded'
import { shrinkPhoto } from '~~/composables/shrinkPhoto'
import { deviceNow } from '~~/stores/posting'
import type { CsvPreviewAnswer, SettlementAnswer } from '~~/utils/contract/settlement'
import type { ShipmentFile, ShipmentFilesAnswer } from '~~/utils/contract/shipmentFiles'
import type { DisputeOutcome } from '~~/utils/settlement/dispute'
import type { LineFigures, StatementFigures } from '~~/utils/settlement/figures'
import type { UploadAnswer } from '~~/utils/contract/uploads'

/** How a statement's file is read. */
interface CsvReading { file: File, encoding: string, delimiter: string, decimal: string, unit: string, columns: object }

/**
 * A shipment's settlement, and what may be done to it. What is sent again after a broken connection has the same id, and
 * is done once.
 */
export function useSettlement(shipmentId: string) {
  const api = useApi()
  const path = `/api/shipments/${shipmentId}`
  const { data, problem, refresh } = useLoaded(`settlement ${shipmentId}`, () => api.get<SettlementAnswer>(`${path}/settlement`))
  const { busy, problem: actProblem, attempt } = useAttempt()
  const idOf = useEventIds()
  const preview = shallowRef<CsvPreviewAnswer | null>(null)

  /** Does something at most once: the same thing about the same figures has the same id. */
  function act(about: string, send: (envelope: { id: string, occurredAt: string }) => Promise<SettlementAnswer>): Promise<boolean> {
    const id = idOf(`${about} at ${data.value?.revision}`)
    return attempt(async () => {
      data.value = await send({ id, occurredAt: deviceNow() })
    })
  }

  function saveLines(lines: ({ cylinderId: string } & LineFigures)[]) {
    return act(`lines ${JSON.stringify(lines)}`, envelope => api.put(`${path}/settlement/lines`, { ...envelope, revision: data.value!.revision, lines }))
  }

  function saveStatement(statement: StatementFigures) {
    return act(`statement ${JSON.stringify(statement)}`, envelope => api.put(`${path}/settlement/statement`, { ...envelope, revision: data.value!.revision, ...statement }))
  }

  /** @param missing those that did not arrive and are recorded as missing. */
  function settle(missing: readonly string[]) {
    const { lines, revision } = data.value!
    const recorded = lines.filter(({ cylinder, figures }) => figures.outcome === 'taken-over' || missing.includes(cylinder.id))
    return act('settle', envelope => api.post(`${path}/settlement/settle`, {
      ...envelope, deviceNow: envelope.occurredAt, revision,
      lines: recorded.map(({ cylinder, version }) => ({ cylinderId: cylinder.id, expects: version, eventId: idOf(`settles ${cylinder.id} at ${version}`) })),
    }))
  }

  function close() {
    return act('close', envelope => api.post(`${path}/settlement/close`, envelope))
  }

  function open(about: string, cylinderId: string | null, text: string) {
    return act(`open ${about} ${cylinderId} ${text}`, envelope => api.post(`${path}/disputes`, { ...envelope, disputeId: idOf(`dispute ${envelope.id}`), about, cylinderId, text }))
  }

  function say(disputeId: string, said: number, text: string, photo: File | null, photoIds: readonly string[]) {
    return act(`say ${disputeId} ${said} ${text}`, async (envelope) => {
      const own = photo ? [await sendPhoto(photo, idOf(`photo ${envelope.id}`))] : []
      return api.post(`${path}/disputes/${disputeId}/messages`, { ...envelope, text, photoIds: [...photoIds, ...own] })
    })
  }

  function end(disputeId: string, said: number, outcome: DisputeOutcome, reason: string) {
    return act(`end ${disputeId} ${said}`, envelope => api.post(`${path}/disputes/${disputeId}/end`, { ...envelope, outcome, reason }))
  }

  function reopen(disputeId: string, said: number, reason: string) {
    return act(`reopen ${disputeId} ${said}`, envelope => api.post(`${path}/disputes/${disputeId}/reopen`, { ...envelope, reason }))
  }

  async function sendPhoto(photo: File, id: string): Promise<string> {
    const form = formOf({ id, subject: 'other' }, new File([await shrinkPhoto(photo)], 'photo'))
    return (await api.post<UploadAnswer>('/api/uploads', form)).id
  }

  function readCsv(reading: CsvReading) {
    preview.value = null
    return attempt(async () => {
      preview.value = await api.post<CsvPreviewAnswer>(`${path}/settlement/csv-preview`, csvForm(reading))
    })
  }

  function takeOver(reading: CsvReading) {
    const { hash } = preview.value!
    return act(`take over ${hash}`, (envelope) => {
      const form = csvForm(reading)
      for (const [name, value] of Object.entries({ ...envelope, previewHash: hash })) form.append(name, value)
      return api.post<SettlementAnswer>(`${path}/settlement/csv-take-over`, form)
    })
  }

  function addFile(file: File, kind: ShipmentFile['kind'], cylinderIds: readonly string[]) {
    const id = idOf(`file ${file.name} ${file.size} ${file.lastModified} at ${data.value?.files.length}`)
    return changeFiles(() => api.post(`${path}/files`, formOf({ id, kind, name: file.name, cylinderIds: cylinderIds.join(',') }, file)))
  }

  function tieFile(id: string, cylinderIds: readonly string[]) {
    return changeFiles(() => api.put(`${path}/files/${id}/lines`, { id: crypto.randomUUID(), occurredAt: deviceNow(), cylinderIds }))
  }

  function withdrawFile(id: string) {
    return changeFiles(() => api.post(`${path}/files/${id}/withdraw`, { id: idOf(`withdraw ${id}`), occurredAt: deviceNow() }))
  }

  function changeFiles(send: () => Promise<ShipmentFilesAnswer>): Promise<boolean> {
    return attempt(async () => {
      const { items } = await send()
      data.value = { ...data.value!, files: items }
    })
  }

  return { data, problem, refresh, busy, actProblem, preview, saveLines, saveStatement, settle, close, open, say, end, reopen, readCsv, takeOver, addFile, tieFile, withdrawFile }
}

function csvForm({ file, encoding, delimiter, decimal, unit, columns }: CsvReading): FormData {
  return formOf({ encoding, decimal, ...delimiter && { delimiter }, ...unit && { unit }, ...Object.keys(columns).length > 0 && { columns: JSON.stringify(columns) } }, file)
}

function formOf(fields: Record<string, string>, file: File): FormData {
  const form = new FormData()
  for (const [name, value] of Object.entries(fields)) form.append(name, value)
  form.append('file', file)
  return form
}
