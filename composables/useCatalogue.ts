/** The refrigerant catalogue and the judging of an event, a part of its own: fetched when first asked for, then kept. */
export function useCatalogue() {
  return async () => {
    const [{ CATALOGUE }, { preview }] = await Promise.all([
      import('~~/utils/refrigerant/allRefrigerants'),
      import('~~/utils/custody/preview'),
    ])
    return { catalogue: CATALOGUE, preview }
  }
}
