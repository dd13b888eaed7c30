import { setResponseHeaders } from 'h3'
import { useDatabase } from '~~/server/utils/database/currentDatabase'
import { photoFile } from '~~/server/utils/files/photoFile'
import { useFiles } from '~~/server/utils/files/photoFiles'
import { apiRoute } from '~~/server/utils/http/apiRoute'
import { idParams } from '~~/utils/contract/parts'
import { uploadQuery } from '~~/utils/contract/uploads'

/** GET /api/uploads/{id}: a photo, or its thumbnail. Opened by itself it is saved and never shown as a page of ours. */
export default apiRoute({ permission: 'fleet:read', params: idParams, query: uploadQuery }, async ({ event, params, query }) => {
  const bytes = await photoFile(useDatabase(), useFiles(), params.id, query.size)
  setResponseHeaders(event, {
    'Content-Type': 'image/jpeg',
    'Content-Disposition': `attachment; filename="photo-${params.id}.jpg"`,
    'X-Content-Type-Options': 'nosniff',
    'Content-Security-Policy': 'default-src \'none\'; sandbox',
    'Cross-Origin-Resource-Policy': 'same-origin',
    // On a phone that several use, nobody sees it without having signed in.
    'Cache-Control': 'private, no-store',
  })
  return bytes
})
