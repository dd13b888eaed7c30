import type { ManifestOptions } from 'vite-plugin-pwa'

/** How the application presents itself once it is installed; the colours are those of the light screens. */
export const WEB_MANIFEST: Partial<ManifestOptions> = {
  id: '/',
  name: 'Collarbook',
  short_name: 'Collarbook',
  description: 'Refrigerant cylinders: contents, safe fill, place and holder, retest dates and the custody log.',
  lang: 'en',
  start_url: '/',
  scope: '/',
  display: 'standalone',
  background_color: '#e4e3db',
  theme_color: '#f6c500',
  icons: [
    { src: '/icons/192.png', sizes: '192x192', type: 'image/png' },
    { src: '/icons/512.png', sizes: '512x512', type: 'image/png' },
    { src: '/icons/maskable-512.png', sizes: '512x512', type: 'image/png', purpose: 'maskable' },
  ],
  shortcuts: [{ name: 'Scan a label', url: '/scan' }],
}
