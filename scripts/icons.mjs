// Writes public/icons/*.png from public/logo.svg: what a phone shows for the installed application.
import { mkdirSync, readFileSync, writeFileSync } from 'node:fs'
import { dirname, join, resolve } from 'node:path'
import { fileURLToPath } from 'node:url'
import { createJiti } from 'jiti'

const root = resolve(dirname(fileURLToPath(import.meta.url)), '..')
const folder = join(root, 'public', 'icons')
const { launchBrowser } = await createJiti(import.meta.url).import('../tests/helpers/browser.ts')

// Of a maskable icon only the middle 80 % is sure to be seen (W3C Web Application Manifest, "Icon masks and safe zone").
const ICONS = [
  { name: '192', size: 192, logo: 0.84, ground: 'transparent' },
  { name: '512', size: 512, logo: 0.84, ground: 'transparent' },
  { name: 'maskable-512', size: 512, logo: 0.6, ground: '#faf9f5' },
  { name: 'apple-180', size: 180, logo: 0.74, ground: '#faf9f5' },
]

const logo = `data:image/svg+xml;base64,${readFileSync(join(root, 'public', 'logo.svg')).toString('base64')}`
const browser = await launchBrowser()
try {
  mkdirSync(folder, { recursive: true })
  for (const { name, size, logo: share, ground } of ICONS) {
    const page = await browser.newPage({ viewport: { width: size, height: size } })
    await page.setContent(`<body style="margin:0;height:100vh;display:grid;place-items:center;background:${ground}"><img src="${logo}" style="width:${share * 100}%">`)
    await page.locator('img').evaluate(image => image.decode())
    writeFileSync(join(folder, `${name}.png`), await page.screenshot({ omitBackground: true }))
    await page.close()
  }
}
finally {
  await browser.close()
}
