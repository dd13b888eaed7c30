import { randomUUID } from 'node:crypto'
import { afterEach, beforeEach, describe, expect, it } from 'vitest'
import { cylinderPhotos } from '../../../server/utils/files/cylinderPhotos'
import { exportedPhotos } from '../../../server/utils/files/exportedPhotos'
import { keepPhoto } from '../../../server/utils/files/keepPhoto'
import type { PhotoFiles } from '../../../server/utils/files/photoFiles'
import type { Upload } from '../../../utils/contract/uploads'
import { newCylinder, openLogDatabase, record, sent, type LogDatabase } from '../../helpers/logDatabase'
import { redAndBlue, redAndBlueJpeg } from '../../helpers/pictures'
import { lb } from '../../helpers/stamps'

let log: LogDatabase
let kept: Map<string, Buffer>
let files: PhotoFiles
let cylinderId: string
beforeEach(async () => {
  log = await openLogDatabase()
  kept = new Map()
  files = {
    keep: async (name, bytes) => void kept.set(name, Buffer.from(bytes)),
    read: async name => kept.get(name) ?? null,
    probe: async () => undefined,
  }
  cylinderId = await newCylinder(log)
})
afterEach(() => log.close())

const photo = (changes: Partial<Upload> = {}): Upload => ({ id: randomUUID(), subject: 'scale', file: redAndBlue(), ...changes })
const keep = (upload: Upload, access = log.technician, now = 1_000) => keepPhoto(log.db, files, upload, access, now)
const refusal = (upload: Upload, access = log.technician) => keep(upload, access).then(() => null, error => error.details)
const rows = async () => Number((await log.db.readClient.execute('SELECT count(*) FROM attachments')).rows[0]![0])

async function weighed(more: object = {}): Promise<string> {
  const event = sent(cylinderId, 'weighed', { gross: lb(30) }, more)
  const [result] = await record(log.db, log.technician, [event])
  expect(result!.outcome).toBe('accepted')
  return event.id
}

describe('a photo', () => {
  it('that is sent twice is kept once and answered the same', async () => {
    const upload = photo()
    const first = await keep(upload)
    expect(await keep(upload, log.technician, 9_000)).toEqual(first)
    expect(await rows()).toBe(1)
    expect([...kept.keys()].sort()).toEqual([`${first.contentHash}-thumb.jpg`, `${first.contentHash}.jpg`])
  })

  it('that is sent twice at the same moment is kept once too', async () => {
    const upload = photo()
    const [one, two] = await Promise.all([keep(upload), keep(upload)])
    expect(one).toEqual(two)
    expect(await rows()).toBe(1)
  })

  it('does not take the place of another under its id, nor its author\'s', async () => {
    const upload = photo()
    await keep(upload)
    expect(await refusal({ ...upload, file: redAndBlue(66, 32) })).toMatchObject({ status: 409 })
    expect(await refusal({ ...upload, subject: 'stamp' })).toMatchObject({ status: 409 })
    expect(await refusal(upload, log.manager)).toMatchObject({ status: 409 })
    expect(await rows()).toBe(1)
  })

  it('is told by its bytes and not by what it is called', async () => {
    const texts = ['<html>', '%PDF-1.7', 'GIF89a and more', 'PK\u0003\u0004', '<svg xmlns="http://www.w3.org/2000/svg"/>']
    for (const text of texts) expect(await refusal(photo({ file: Uint8Array.from(Buffer.from(text)) }))).toMatchObject({ status: 415, type: 'not-a-picture' })
    const heic = Uint8Array.from(Buffer.from('\0\0\0\u0018ftypheic\0\0\0\0mif1heic', 'latin1'))
    expect(await refusal(photo({ file: heic }))).toMatchObject({ status: 415, type: 'heic', detail: expect.stringContaining('JPEG') })
    expect([await rows(), kept.size]).toEqual([0, 0])
  })

  it('that ends too early leaves nothing behind', async () => {
    const jpeg = await redAndBlueJpeg(300, 200)
    expect(await refusal(photo({ file: jpeg.slice(0, jpeg.length - 40) }))).toMatchObject({ status: 422 })
    expect([await rows(), kept.size]).toEqual([0, 0])
  })

  it('has no row where the store did not take its file', async () => {
    const failing = { ...files, keep: () => Promise.reject(new Error('full')) }
    await expect(keepPhoto(log.db, failing, photo(), log.technician, 1)).rejects.toThrow('full')
    expect(await rows()).toBe(0)
  })

  it('is neither changed nor deleted', async () => {
    await keep(photo({ eventId: await weighed() }))
    for (const sql of ['UPDATE attachments SET subject = \'stamp\'', 'DELETE FROM attachments', 'UPDATE attachment_events SET put_by = \'x\'', 'DELETE FROM attachment_events']) {
      await expect(log.db.write([sql])).rejects.toThrow(/append-only/)
    }
    await log.db.write(['INSERT OR REPLACE INTO attachments SELECT id, \'stamp\', taken_at, sent_by, arrived_at, source_hash, content_hash, bytes, width, height FROM attachments'])
    expect((await log.db.readClient.execute('SELECT subject FROM attachments')).rows[0]![0]).toBe('scale')
  })
})

describe('the photos of an event', () => {
  const photos = async () => (await cylinderPhotos(log.db, cylinderId)).items

  it('are on their way until they have arrived: the event does not wait', async () => {
    const [one, two] = [photo(), photo({ file: redAndBlue(80, 40) })]
    const eventId = await weighed({ photoIds: [one.id, two.id] })
    expect(await photos()).toEqual([{ eventId, photos: [], onTheWay: 2 }])
    const answer = await keep({ ...one, takenAt: '2026-05-14T09:00:00-05:00' }, log.technician, Date.parse('2026-05-14T14:00:01Z'))
    expect(await photos()).toEqual([{ eventId, onTheWay: 1, photos: [{
      id: one.id, subject: 'scale', takenAt: '2026-05-14T14:00:00.000Z', arrivedAt: '2026-05-14T14:00:01.000Z',
      by: { id: log.technician.personId, name: 'Person 1' }, putAt: null, width: 64, height: 32, contentHash: answer.contentHash,
    }] }])
  })

  it('are also those that prove the end of a cylinder', async () => {
    const proof = photo({ subject: 'other' })
    const event = sent(cylinderId, 'retired', { reason: 'scrapped', proof: { photoIds: [proof.id] } }, { expects: 1 })
    expect((await record(log.db, log.manager, [event]))[0]).toMatchObject({ outcome: 'accepted' })
    expect(await photos()).toEqual([{ eventId: event.id, photos: [], onTheWay: 1 }])
    await keep(proof, log.manager)
    expect(await photos()).toMatchObject([{ eventId: event.id, onTheWay: 0, photos: [{ id: proof.id }] }])
  })

  it('are none of a person who is not its author, though they guessed the id', async () => {
    const upload = photo()
    const eventId = await weighed({ photoIds: [upload.id] })
    await keep(upload, log.warehouse)
    expect(await photos()).toEqual([{ eventId, photos: [], onTheWay: 1 }])
  })

  it('may be put to it later by its author and by a manager, by nobody else', async () => {
    const eventId = await weighed()
    expect(await refusal(photo({ eventId }), log.warehouse)).toMatchObject({ status: 403 })
    await keep(photo({ eventId }), log.technician, 5_000)
    await keep(photo({ eventId, subject: 'damage' }), log.manager, 7_000)
    expect((await photos())[0]!.photos.map(({ subject, putAt, by }) => [subject, putAt, by.name])).toEqual([
      ['scale', '1970-01-01T00:00:05.000Z', 'Person 1'], ['damage', '1970-01-01T00:00:07.000Z', 'Person 2'],
    ])
  })

  it('go with the export of the log, each with the hash of its file', async () => {
    const eventId = await weighed()
    const [one, two] = [photo(), photo({ eventId, file: redAndBlue(80, 40) })]
    const { contentHash } = await keep(one)
    await keep(two, log.technician, 7_000)
    const lines: object[] = []
    for await (const some of exportedPhotos(log.db)) lines.push(...some)
    expect(lines).toMatchObject([
      { photo: { id: one.id, contentHash, sentBy: log.technician.personId, arrivedAt: 1_000 } },
      { photo: { id: two.id } },
      { photoPut: { photoId: two.id, eventId, putBy: log.technician.personId, putAt: 7_000 } },
    ])
    expect(lines[0]).not.toHaveProperty('photo.rowid')
  })

  it('belong to an event that there is', async () => {
    expect(await refusal(photo({ eventId: randomUUID() }))).toMatchObject({ status: 422, errors: [{ path: 'eventId' }] })
    expect(await rows()).toBe(0)
  })

  it('change nothing in the log and its hashes', async () => {
    const eventId = await weighed()
    const lines = async () => (await log.db.readClient.execute('SELECT * FROM custody_events ORDER BY seq')).rows.map(row => Object.values(row))
    const before = await lines()
    await keep(photo({ eventId }))
    expect(await lines()).toEqual(before)
    expect(before).toHaveLength(2)
  })
})
