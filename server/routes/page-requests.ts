import { Router } from 'express'
import type { DataSource } from 'typeorm'
import { pageRequestInput } from '../../shared/page-requests.js'
import type { PageRequestAnswer } from '../../shared/page-requests.js'
import { jsonBody } from '../middleware/json-body.js'
import { limitRate } from '../middleware/rate-limit.js'
import { askForPage } from '../services/page-requests/ask-for-page.js'

/** How many pages one network address may ask for. */
export const PAGE_REQUEST_LIMIT = { name: 'page-requests', requests: 20, seconds: 3600 }

/** `POST /page-requests`: counts the wish for a page that does not exist yet. */
export function pageRequests(dataSource: DataSource): Router {
  const router = Router()
  router.post('/', limitRate(dataSource, PAGE_REQUEST_LIMIT), jsonBody(), async (request, response) => {
    const { name } = pageRequestInput.parse(request.body)
    const answer: PageRequestAnswer = await askForPage(dataSource.manager, name, new Date())
    response.setHeader('Cache-Control', 'no-store')
    response.json(answer)
  })
  return router
}
