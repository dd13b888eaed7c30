/** The page of a cylinder: by its label, as the symbol on it says, else by its id. */
export function cylinderPath(cylinder: { id: string, labelCode: string | null }): string {
  return `/c/${(cylinder.labelCode ?? cylinder.id).toLowerCase()}`
}
