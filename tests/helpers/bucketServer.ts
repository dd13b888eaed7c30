import { createServer, type Server } from 'node:http'
import type { AddressInfo } from 'node:net'

/** A store that speaks what is asked of S3: objects of one bucket put, read, looked for and removed by signed requests. */
export interface BucketServer {
  port: number
  objects: Map<string, Buffer>
  /** What each request signed itself by. */
  signatures: string[]
  stop: () => Promise<void>
}

/** Source: Amazon S3 API reference, PutObject, GetObject, HeadObject, DeleteObject; path-style addresses. */
export async function startBucketServer({ bucket, accessKeyId }: { bucket: string, accessKeyId: string }): Promise<BucketServer> {
  const objects = new Map<string, Buffer>()
  const signatures: string[] = []
  const server: Server = createServer((request, response) => {
    const chunks: Buffer[] = []
    request.on('data', (chunk: Buffer) => chunks.push(chunk))
    request.on('end', () => {
      const [, inBucket = '', ...key] = decodeURIComponent((request.url ?? '').split('?')[0]!).split('/')
      const name = key.join('/')
      const signed = request.headers.authorization ?? ''
      signatures.push(signed)
      const answer = (status: number, body?: Buffer) => response.writeHead(status).end(request.method === 'HEAD' ? undefined : body)
      if (!signed.startsWith(`AWS4-HMAC-SHA256 Credential=${accessKeyId}/`)) return answer(403)
      if (inBucket !== bucket) return answer(404)
      if (request.method === 'PUT') {
        objects.set(name, Buffer.concat(chunks))
        return answer(200)
      }
      if (request.method === 'DELETE') {
        objects.delete(name)
        return answer(204)
      }
      const found = objects.get(name)
      return found ? answer(200, found) : answer(404)
    })
  })
  await new Promise<void>(done => server.listen(0, '127.0.0.1', done))
  return {
    port: (server.address() as AddressInfo).port,
    objects,
    signatures,
    stop: () => new Promise((done) => {
      server.close(() => done())
      server.closeAllConnections()
    }),
  }
}
