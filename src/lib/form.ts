import type { FieldValues, Path, UseFormSetError } from 'react-hook-form'
import type { z } from 'zod'
import type { Endpoint } from '#shared/contract/endpoint'
import { isApiError } from './api-error'

/** The body schema of an endpoint, for a form’s resolver: the form and the API then agree on every limit. */
export function bodySchema<Body extends z.ZodType>(
  endpoint: Endpoint<z.ZodType | undefined, z.ZodType | undefined, Body, z.ZodType | undefined>,
): Body {
  if (endpoint.body === undefined) throw new TypeError(`${endpoint.path} takes no body.`)
  return endpoint.body
}

/**
 * Puts the API’s objections beside the fields they name. Returns true when every one found its field, so that the form
 * need not repeat them above.
 */
export function showServerErrors<Values extends FieldValues>(
  error: unknown,
  setError: UseFormSetError<Values>,
  fields: ReadonlyArray<Path<Values>>,
): boolean {
  if (!isApiError(error) || error.fields.length === 0) return false
  let placed = 0
  for (const { path, message } of error.fields) {
    const name = path.replace(/^body\./, '')
    const field = fields.find((candidate) => candidate === name)
    if (field === undefined) continue
    setError(field, { type: 'server', message }, { shouldFocus: placed === 0 })
    placed += 1
  }
  return placed === error.fields.length
}
