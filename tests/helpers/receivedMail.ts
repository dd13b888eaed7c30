import { SMTPServer } from 'smtp-server'
import { getPort } from 'get-port-please'

/** A letter as a mail server got it: its headers, text, and the papers with it. */
export interface ReceivedLetter { to: string[], from: string, subject: string, text: string, papers: { name: string, type: string, content: Buffer }[] }

/** A real mail server for a test; it refuses the addresses that `refuses` names. */
export async function mailServer(refuses: (address: string) => boolean = () => false) {
  const port = await getPort({ host: '127.0.0.1', random: true })
  const received: ReceivedLetter[] = []
  const server = new SMTPServer({
    authOptional: true,
    disabledCommands: ['STARTTLS'],
    onRcptTo: ({ address }, _session, callback) => callback(refuses(address) ? new Error('No such mailbox') : undefined),
    onData(stream, session, callback) {
      const chunks: Buffer[] = []
      stream.on('data', (chunk: Buffer) => chunks.push(chunk))
      stream.on('end', () => {
        const { mailFrom, rcptTo } = session.envelope
        received.push({ to: rcptTo.map(({ address }) => address), from: mailFrom ? mailFrom.address : '', ...readLetter(Buffer.concat(chunks).toString('latin1')) })
        callback()
      })
    },
  })
  await new Promise<void>(done => server.listen(port, '127.0.0.1', done))
  return { url: `smtp://127.0.0.1:${port}`, received, stop: () => new Promise<void>(done => server.close(done)) }
}

function readLetter(raw: string): Pick<ReceivedLetter, 'subject' | 'text' | 'papers'> {
  const { headers, body } = partOf(raw)
  const boundary = /boundary="?([^";\s]+)/i.exec(headers)?.[1]
  const parts = boundary === undefined ? [{ headers, body }] : body.split(`--${boundary}`).slice(1, -1).map(part => partOf(part.replace(/^\r\n/, '')))
  const isPaper = (part: { headers: string }) => /Content-Disposition: attachment/i.test(part.headers)
  return {
    subject: wordsOf(/^Subject: ((?:.*)(?:\r\n[ \t].*)*)/mi.exec(headers)?.[1] ?? ''),
    text: parts.filter(part => !isPaper(part)).map(decoded).map(content => content.toString('utf8')).join(''),
    papers: parts.filter(isPaper).map(part => ({
      name: /filename="?([^";\r\n]+)/i.exec(part.headers)?.[1] ?? '',
      type: /Content-Type: ([^;\r\n]+)/i.exec(part.headers)?.[1] ?? '',
      content: decoded(part),
    })),
  }
}

function partOf(raw: string): { headers: string, body: string } {
  const cut = raw.indexOf('\r\n\r\n')
  return { headers: raw.slice(0, cut), body: raw.slice(cut + 4) }
}

function decoded({ headers, body }: { headers: string, body: string }): Buffer {
  const encoding = /Content-Transfer-Encoding: (\S+)/i.exec(headers)?.[1]?.toLowerCase()
  if (encoding === 'base64') return Buffer.from(body, 'base64')
  if (encoding === 'quoted-printable') return Buffer.from(body.replace(/=\r\n/g, '').replace(/=([0-9A-F]{2})/g, (_, hex: string) => String.fromCharCode(Number.parseInt(hex, 16))), 'latin1')
  return Buffer.from(body, 'latin1')
}

/** A header in words: folded lines joined, encoded words of UTF-8 read. */
function wordsOf(header: string): string {
  return header.replace(/\r\n[ \t]/g, ' ').replace(/=\?utf-8\?q\?([^?]*)\?=\s*/gi, (_, text: string) =>
    decoded({ headers: 'Content-Transfer-Encoding: quoted-printable', body: text.replaceAll('_', ' ') }).toString('utf8'))
}
