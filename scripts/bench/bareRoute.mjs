// A route that reads one SELECT and answers its rows, and nothing else: what `bench:fleet` holds the fleet's list to.
import { createServer } from 'node:http'
import process from 'node:process'
import { createClient } from '@libsql/client'
import { createApp, eventHandler, toNodeListener } from 'h3'

const [file, statement] = process.argv.slice(2)
const select = JSON.parse(statement)
const client = createClient({ url: `file:${file}`, concurrency: 4 })
const app = createApp().use(eventHandler(async () => (await client.execute(select)).rows))
const server = createServer(toNodeListener(app))
server.listen(0, '127.0.0.1', () => process.send({ port: server.address().port }))
