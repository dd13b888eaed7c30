/** The refrigerant catalogue, a part of its own: fetched when first asked for, then kept. */
export function useCatalogue() {
  return () => import('~~/utils/refrigerant/catalogue')
}
