import { describe, expect, it } from 'vitest'
import { ERROR_CODES, ERROR_STATUS } from '#shared/contract/error-codes'
import { AppError, explain, notFound } from '#server/errors'

describe('an AppError', () => {
  it.each(ERROR_CODES)('%s travels under the status of the contract', (code) => {
    expect(new AppError(code, 'x').status).toBe(ERROR_STATUS[code])
  })

  it('for a missing row names it and nothing else', () => {
    expect(notFound('That athlete')).toMatchObject({
      code: 'not_found',
      message: 'That athlete was not found.',
      fields: [],
    })
  })
})

describe('an error in words', () => {
  it('is its message, or those of the errors inside', () => {
    expect(explain(new Error('no disk'))).toBe('no disk')
    expect(
      explain(new AggregateError([new Error('::1 refused'), new Error('127.0.0.1 refused'), new Error('::1 refused')])),
    ).toBe('::1 refused; 127.0.0.1 refused')
    expect(explain('plain')).toBe('plain')
  })
})
