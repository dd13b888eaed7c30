import { z } from 'zod'
import { line, prose, uuid } from './parts'

const MOST_PHOTOS = 20

const proof = z.strictObject({
  text: prose(1000).optional(),
  certificate: line(80).optional(),
  photoIds: z.array(uuid).min(1, 'must name a photo').max(MOST_PHOTOS, `must be at most ${MOST_PHOTOS} photos`).optional(),
}).refine(({ text, certificate, photoIds }) => (text ?? certificate ?? photoIds) !== undefined, 'must hold a text, a certificate or photos')

/** A cylinder's life ends: scrapped, sold, gone for good. The proof is of what was done with it. */
export const details = z.strictObject({ reason: prose(300), proof: proof.optional() })
