import { v7 as uuid } from 'uuid'
import type { NewTestLot } from '~~/utils/contract/testLots'
import { createDraft } from '../cylinder-lists/drafts'
import type { Database } from '../database/database'
import { directory } from '../directory/directory'
import { problem } from '../http/problem'

/**
 * A draft of a lot for the test station; answers its id. The same draft sent again changes nothing.
 *
 * Errors: 422 for another sort of firm or an unknown cylinder; 409 for a cylinder on another list.
 */
export async function createTestLot(db: Database, body: NewTestLot, createdBy: string, now: number): Promise<string> {
  const firm = (await directory(db, true)).firms.get(body.requalifierId)
  if (firm?.kind !== 'requalifier' || !firm.active) {
    throw problem(422, 'Not a requalifier of ours', 'Choose the test station that it goes to.', [{ path: 'requalifierId', message: 'must be a requalifier in use' }])
  }
  const id = body.id ?? uuid()
  await createDraft(db, { kind: 'test-lot', id }, { firmId: firm.id, note: body.note ?? null, cylinderIds: body.cylinderIds, createdBy, now })
  return id
}
