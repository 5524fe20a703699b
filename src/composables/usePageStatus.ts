import { usePageContext } from './page-context.js'

/** Lets a view say with which HTTP status the server answers, or where the page has moved to. */
export function usePageStatus(): {
  setStatus(status: number): void
  redirect(location: string, status?: 301 | 303): void
} {
  const { response } = usePageContext()
  return {
    setStatus(status) {
      response.status = status
    },
    redirect(location, status = 301) {
      response.status = status
      response.location = location
    },
  }
}
