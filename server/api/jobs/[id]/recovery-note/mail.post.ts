import { useDatabase } from '~~/server/utils/database/currentDatabase'
import { apiRoute } from '~~/server/utils/http/apiRoute'
import { mailRecoveryNote } from '~~/server/utils/jobs/mailRecoveryNote'
import { recoveryNoteMailBody } from '~~/utils/contract/jobs'
import { idParams } from '~~/utils/contract/parts'

/** POST /api/jobs/{id}/recovery-note/mail: sends the customer the note as it now stands. The same id sent twice goes once. */
export default apiRoute({ permission: 'jobs:record', params: idParams, body: recoveryNoteMailBody }, ({ access, params, body }) =>
  mailRecoveryNote(useDatabase(), params.id, { ...body, sentBy: access.personId }, Date.now()))
