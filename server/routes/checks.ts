import { Router } from 'express'
import type { DataSource } from 'typeorm'
import { z } from 'zod'
import { checkInputSchema } from '../../shared/checker/check.js'
import { checkReadings } from '../../shared/checker/check-readings.js'
import { NotFound } from '../errors.js'
import { jsonBody } from '../middleware/json-body.js'
import { limitRate } from '../middleware/rate-limit.js'
import { findSpeciesPage } from '../queries/species.js'
import { revisionNumberSchema, slugSchema } from './page-key.js'

/** How many checks one network address may ask for. */
export const CHECK_LIMIT = { name: 'checks', requests: 120, seconds: 60 }

const pageKeySchema = z.object({ slug: slugSchema, revision: revisionNumberSchema.nullable() })

/** `POST /checks`: holds readings against a page at one revision. It keeps nothing. */
export function checks(dataSource: DataSource): Router {
  const router = Router()
  router.post('/', limitRate(dataSource, CHECK_LIMIT), jsonBody(), async (request, response) => {
    const input = checkInputSchema.parse(request.body)
    const canExist = pageKeySchema.safeParse(input).success
    const page = canExist ? await findSpeciesPage(dataSource.manager, input.slug, input.revision) : null
    if (page === null) throw new NotFound('There is no such species page, or not at this revision.')
    response.setHeader('Cache-Control', 'no-store')
    response.json(checkReadings(page, input))
  })
  return router
}
