import { z } from 'zod'
import { LARGEST_FILE } from '../settlement/fileKinds'
import { eachOnce, id } from './parts'

const cylinderIds = z.array(id).max(200).refine(ids => eachOnce(ids), 'must name each cylinder once')
const FILE_PURPOSES = ['statement', 'certificate', 'other'] as const

/** POST /api/shipments/{id}/files: one file, by an id of the sender's. What it is, is told by its content and not by its name. */
export const shipmentFileForm = z.strictObject({
  id,
  kind: z.enum(FILE_PURPOSES),
  name: z.string().max(400),
  cylinderIds: z.string().max(20_000).transform(text => text === '' ? [] : text.split(',')).pipe(cylinderIds).default([]),
  file: z.custom<Uint8Array>(value => value instanceof Uint8Array && value.length > 0 && value.length <= LARGEST_FILE, `must be a file of at most ${LARGEST_FILE / 1024 / 1024} MiB`)
    .meta({ type: 'string', contentEncoding: 'binary' }),
})
export type NewShipmentFile = z.output<typeof shipmentFileForm>

/** The path of one file of a shipment. */
export const shipmentFileParams = z.strictObject({ id, file: id })

/** PUT /api/shipments/{id}/files/{file}/lines: the lines that it belongs to. */
export const fileLinesBody = z.strictObject({ id, occurredAt: z.iso.datetime({ offset: true }), cylinderIds })
export type FileLines = z.output<typeof fileLinesBody>

/** POST /api/shipments/{id}/files/{file}/withdraw. */
export const fileWithdrawBody = z.strictObject({ id, occurredAt: z.iso.datetime({ offset: true }) })
export type FileWithdrawal = z.output<typeof fileWithdrawBody>

/** A file that was added to a shipment. */
export interface ShipmentFile {
  id: string
  kind: (typeof FILE_PURPOSES)[number]
  name: string
  mediaType: string
  bytes: number
  contentHash: string
  /** Empty where it belongs to the whole shipment. */
  cylinderIds: string[]
  by: string | null
  at: string
}
/** GET /api/shipments/{id}/files. */
export interface ShipmentFilesAnswer { items: ShipmentFile[] }
