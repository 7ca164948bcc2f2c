import { resolve } from 'node:path'
import express, { Router } from 'express'
import { sendProblem } from '~/middleware/send-problem.server'

/**
 * Serves the built files. What stands under `/assets` carries its hash in its name and is kept for good; a name that
 * is not there answers 404 without asking the pages.
 */
export function staticFiles(folder = resolve('build/client')): Router {
  const router = Router()
  router.use('/assets', express.static(resolve(folder, 'assets'), { immutable: true, maxAge: '1y', index: false }))
  router.use('/assets', (_request, response) => {
    sendProblem(response, 'not-found')
  })
  router.use(express.static(folder, { maxAge: '1h', index: false, redirect: false }))
  return router
}
