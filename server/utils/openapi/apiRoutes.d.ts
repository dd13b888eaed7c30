/** Made at build from the files of server/api. */
declare module '#api-routes' {
  import type { RouteDescription } from '../http/apiRoute'

  const routes: {
    /** As the router has it: `/api/places/:id`. */
    path: string
    method: string
    load: () => Promise<{ default: { described?: RouteDescription } }>
  }[]
  export default routes
}
