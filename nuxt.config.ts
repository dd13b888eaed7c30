import { createHash } from 'node:crypto'
import { cpSync } from 'node:fs'
import { join } from 'node:path'
import { sharedParts } from './build/sharedParts'
import { WEB_MANIFEST } from './service-worker/webManifest'

/** What lies in an address that opens something by itself: named to nobody else, and in no index. */
const OPENS_BY_ITSELF = { headers: { 'X-Robots-Tag': 'noindex, nofollow' }, security: { headers: { referrerPolicy: 'no-referrer' as const } } }

export default defineNuxtConfig({
  modules: [
    '@pinia/nuxt', '@nuxtjs/tailwindcss', 'nuxt-auth-utils', 'nuxt-security',
    '@nuxt/eslint', '@nuxtjs/color-mode', '@vite-pwa/nuxt',
  ],
  // Our own code is imported by path, so that the import table can be checked; components stay registered.
  imports: { scan: false },
  devtools: { enabled: false },
  app: {
    head: {
      htmlAttrs: { lang: 'en' },
      titleTemplate: '%s · Collarbook',
      title: 'Collarbook',
      meta: [
        { name: 'viewport', content: 'width=device-width, initial-scale=1, viewport-fit=cover' },
        // The bands of light and dark, which the phone's own bar goes on from.
        { name: 'theme-color', content: '#f6c500', media: '(prefers-color-scheme: light)' },
        { name: 'theme-color', content: '#1a1f22', media: '(prefers-color-scheme: dark)' },
      ],
      link: [
        { rel: 'icon', type: 'image/svg+xml', href: '/logo.svg' },
        { rel: 'manifest', href: '/manifest.webmanifest' },
        { rel: 'apple-touch-icon', href: '/icons/apple-180.png' },
      ],
    },
  },
  css: [
    '@fontsource/barlow/latin-400.css', '@fontsource/barlow/latin-600.css', '@fontsource/barlow/latin-700.css',
    '@fontsource/roboto-mono/latin-500.css', '@fontsource/roboto-mono/latin-700.css',
  ],
  colorMode: { classSuffix: '' },
  runtimeConfig: {
    // Name and Secure are set at start by PUBLIC_URL. The longest a session lives: 30 days.
    session: {
      name: '__Host-collarbook', password: '', maxAge: 2_592_000, sessionHeader: false,
      cookie: { path: '/', httpOnly: true, sameSite: 'lax', secure: true },
    },
  },
  srcDir: '.',
  // Drawn in the browser alone, so that it is the same for everybody and may lie on the device.
  routeRules: {
    '/shell': { ssr: false },
    '/d/**': { ...OPENS_BY_ITSELF, ssr: false },
    '/api/dock/**': OPENS_BY_ITSELF,
  },
  // A page is fetched ahead when a hand goes to its link, not because the link is in sight: phones in a plant room.
  experimental: {
    defaults: { nuxtLink: { prefetchOn: { interaction: true, visibility: false } } },
    // A page that cannot be fetched must not take this one away: composables/useUnreachedPage.ts.
    emitRouteChunkError: 'manual',
    // Newer versions are looked for by plugins/serviceWorker.client.ts.
    appManifest: false,
  },
  // Without a shared/ folder, and with utils/ imported by path on both sides.
  compatibilityDate: '2026-01-01',
  nitro: {
    compressPublicAssets: { gzip: true, brotli: true },
    esbuild: { options: { target: 'es2022' } },
    typescript: { tsConfig: { include: ['../types/auth.d.ts'] } },
    hooks: {
      // Nitro traces packages, not our migration files, nor what runs in a thread of its own.
      compiled(nitro) {
        const output = (path: string) => join(nitro.options.output.serverDir, path)
        cpSync('drizzle/migrations', output('drizzle/migrations'), { recursive: true })
        cpSync('server/workers', output('workers'), { recursive: true })
        for (const file of ['package.json', 'THIRD-PARTY-NOTICES.md', 'lib/vips-node.mjs', 'lib/vips.wasm']) {
          cpSync(`node_modules/wasm-vips/${file}`, output(`node_modules/wasm-vips/${file}`))
        }
        for (const file of ['package.json', 'LICENSE', 'build/highs.mjs', 'build/highs.wasm']) {
          cpSync(`node_modules/highs/${file}`, output(`node_modules/highs/${file}`))
        }
      },
    },
  },
  vite: {
    optimizeDeps: { include: ['vue-qrcode-reader', 'qrcode'] },
    $client: { build: { rollupOptions: { output: { manualChunks: sharedParts(), onlyExplicitManualChunks: true } } } },
  },
  // The worker is checked apart, with a worker's globals: tsconfig.worker.json.
  typescript: { strict: true, typeCheck: false, tsConfig: { exclude: ['../service-worker/sw.ts'] } },
  telemetry: false,
  hooks: {
    // A part that a page loads when it is asked for is fetched then, not ahead: phones in a plant room.
    'build:manifest'(manifest) {
      for (const file of Object.values(manifest)) file.prefetch = false
    },
    // The routes as the server has them, for its description of itself.
    'nitro:init'(nitro) {
      nitro.options.virtual['#api-routes'] = () => {
        const routes = nitro.scannedHandlers.filter(({ route, method }) => method && route?.startsWith('/api/'))
        const entries = routes.map(({ route, method, handler }) =>
          `{ path: ${JSON.stringify(route)}, method: ${JSON.stringify(method)}, load: () => import(${JSON.stringify(handler)}) }`)
        return `export default [${entries.join(',\n')}]`
      }
    },
  },
  // Who is signed in is asked by our own routes; the package's plugins would ask its own at each page.
  auth: {
    loadStrategy: 'none',
    // scrypt, N = 2^17, r = 8, p = 1 (OWASP Password Storage Cheat Sheet); 128 MiB each, and the driver wants more than that.
    hash: { scrypt: { cost: 131_072, maxMemory: 268_435_456 } },
  },
  eslint: { config: { stylistic: true } },
  pwa: {
    strategies: 'injectManifest',
    srcDir: 'service-worker',
    filename: 'sw.ts',
    registerType: 'prompt',
    manifest: WEB_MANIFEST,
    registerWebManifestInRouteRules: true,
    // Registered by plugins/serviceWorker.client.ts.
    client: { registerPlugin: false },
    injectManifest: {
      globPatterns: ['**/*.{js,css,wasm,woff2,svg,png,webmanifest}'],
      // The shell names the scripts by their content, so it is another one whenever any file is.
      manifestTransforms: [entries => ({
        manifest: [...entries, { url: '/shell', revision: createHash('sha256').update(JSON.stringify(entries)).digest('hex'), size: 0 }],
      })],
    },
  },
  security: {
    removeLoggers: false,
    corsHandler: false,
    xssValidator: false,
    // Bodies are counted and limited by server/middleware; requests are limited by account in the session routes.
    requestSizeLimiter: false,
    rateLimiter: false,
    headers: {
      contentSecurityPolicy: {
        'default-src': ['\'self\''],
        'base-uri': ['\'none\''],
        'object-src': ['\'none\''],
        'frame-ancestors': ['\'none\''],
        'form-action': ['\'self\''],
        'connect-src': ['\'self\''],
        'font-src': ['\'self\''],
        'img-src': ['\'self\'', 'data:', 'blob:'],
        'manifest-src': ['\'self\''],
        'worker-src': ['\'self\''],
        'style-src': ['\'self\'', '\'unsafe-inline\''],
        'script-src': ['\'self\'', '\'strict-dynamic\'', '\'nonce-{{nonce}}\'', '\'wasm-unsafe-eval\''],
        'script-src-attr': ['\'none\''],
        'upgrade-insecure-requests': false,
      },
      xFrameOptions: 'DENY',
      referrerPolicy: 'same-origin',
      crossOriginOpenerPolicy: 'same-origin',
      permissionsPolicy: { 'camera': ['self'], 'microphone': [], 'geolocation': [], 'display-capture': [], 'fullscreen': ['self'] },
      // HSTS is written by server/middleware when PUBLIC_URL is https.
      strictTransportSecurity: false,
    },
  },
  tailwindcss: { viewer: false, cssPath: '~/assets/css/tailwind.css' },
})
