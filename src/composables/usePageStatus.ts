import { usePageContext } from './page-context.js'

/** Lets a view say with which HTTP status the server answers, or where the page has moved to. */
export function usePageStatus(): { setStatus(status: number): void; redirect(location: string): void } {
  const { response } = usePageContext()
  return {
    setStatus(status) {
      response.status = status
    },
    redirect(location) {
      response.status = 301
      response.location = location
    },
  }
}
