import type { Response } from 'supertest'
import { expect } from 'vitest'
import { errorBody } from '#shared/contract/common'
import { ERROR_STATUS, type ErrorCode } from '#shared/contract/error-codes'

/** The answer is this error in the one error shape; `fields` are the paths it blames. */
export function expectError(response: Response, code: ErrorCode, fields: string[] = []): void {
  const { error } = errorBody.parse(response.body)
  expect({ status: response.status, code: error.code, fields: error.fields.map(({ path }) => path) }).toEqual({
    status: ERROR_STATUS[code],
    code,
    fields,
  })
  expect(error.requestId).toBe(response.headers['x-request-id'])
}
