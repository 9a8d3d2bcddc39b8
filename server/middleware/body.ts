import express, { type RequestHandler } from 'express'
import { LIMITS } from '#shared/contract/limits'
import { AppError } from '../errors'

const hasBody = (headers: Record<string, unknown>) =>
  headers['transfer-encoding'] !== undefined || Number(headers['content-length'] ?? 0) > 0

/** The API reads JSON and nothing else. */
const jsonOnly: RequestHandler = (request, _response, next) => {
  if (hasBody(request.headers) && !request.is('application/json')) {
    throw new AppError('unsupported_media_type', 'Send JSON, with the content type application/json.')
  }
  next()
}

/** Any JSON value is let through, so that the endpoint's schema can say what is wrong with it. */
export const readBody: RequestHandler[] = [jsonOnly, express.json({ limit: LIMITS.requestBody, strict: false })]
