// Runs commands at the same time, prints what each said once it has ended, and fails where one of them failed.
// `node scripts/sideBySide.mjs "eslint ." "vue-tsc -b --noEmit"`
import { spawn } from 'node:child_process'

function run(command) {
  const begun = Date.now()
  let said = ''
  const hear = (words) => {
    said += words
  }
  const child = spawn(command, { shell: true, stdio: ['ignore', 'pipe', 'pipe'] })
  for (const stream of [child.stdout, child.stderr]) stream.setEncoding('utf8').on('data', hear)
  return new Promise(done => child.on('close', (code) => {
    console.log(`> ${command} (${Math.round((Date.now() - begun) / 1000)} s)\n${said}`)
    // A command that was killed has no code.
    done(code ?? 1)
  }))
}

process.exitCode = Math.max(0, ...await Promise.all(process.argv.slice(2).map(run)))
