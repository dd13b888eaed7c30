import { createTransport } from 'nodemailer'
import type { Letter } from './mail'

const PATIENCE_MS = 10_000
const LONGEST_ERROR = 300

/** Hands a letter to the mail server; what that said against it, or null when it took the letter. */
export async function deliver({ recipient, subject, body, attachments = [] }: Letter, url: string, from: string | undefined): Promise<string | null> {
  const transport = createTransport({ url, connectionTimeout: PATIENCE_MS, greetingTimeout: PATIENCE_MS, socketTimeout: PATIENCE_MS })
  try {
    await transport.sendMail({
      from, to: { name: '', address: recipient }, subject, text: body,
      attachments: attachments.map(({ name, mediaType, content }) => ({ filename: name, contentType: mediaType, content })),
      disableFileAccess: true, disableUrlAccess: true,
    })
    return null
  }
  catch (error) {
    return (error instanceof Error ? error.message : 'unknown').slice(0, LONGEST_ERROR)
  }
  finally {
    transport.close()
  }
}
