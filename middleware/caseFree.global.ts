import { normaliseLabelCode } from '~~/utils/label/code'

/** A label's symbol is all upper case; its page is written in lower case. */
export default defineNuxtRouteMiddleware((to) => {
  const [, start = '', ref = '', ...rest] = to.path.split('/')
  if (start.toLowerCase() !== 'c' || ref === '') return
  const code = normaliseLabelCode(decodeURIComponent(ref))
  const path = ['', 'c', code?.toLowerCase() ?? ref, ...rest].join('/')
  if (path !== to.path) return navigateTo({ path, query: to.query, hash: to.hash }, { replace: true, redirectCode: 301 })
})
