import { setResponseHeaders } from 'h3'
import { attachmentParams } from '~~/utils/contract/mail'
import { apiRoute } from '~~/server/utils/http/apiRoute'
import { keptAttachment } from '~~/server/utils/mail/keptMail'

/** GET /api/mail/{id}/attachments/{position}: a paper of a letter, to be saved. */
export default apiRoute({ permission: 'mail:read', params: attachmentParams }, async ({ event, params }) => {
  const { name, mediaType, content } = await keptAttachment(params.id, params.position)
  setResponseHeaders(event, {
    'Content-Type': mediaType,
    'Content-Disposition': `attachment; filename*=UTF-8''${encodeURIComponent(name)}`,
    'X-Content-Type-Options': 'nosniff',
    'Cache-Control': 'no-store',
  })
  return content
})
