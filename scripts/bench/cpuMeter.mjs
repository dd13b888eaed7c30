// Loaded into a server that is measured: tells its own CPU time when asked.
import process from 'node:process'

process.on('message', (message) => {
  if (message !== 'cpu') return
  const { user, system } = process.cpuUsage()
  process.send({ cpuMicroseconds: user + system })
})
