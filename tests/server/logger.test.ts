import { QueryFailedError } from 'typeorm'
import { describe, expect, it } from 'vitest'
import { serializeError } from '#server/logger'

describe('what is logged of an error', () => {
  it('is neither the query, its parameters nor the database’s sentence', () => {
    const driverError = Object.assign(new Error('invalid input: "secret"'), {
      code: '22P02',
      detail: 'Key (note)=(secret)',
      table: 'users',
    })
    const error = new QueryFailedError("insert into users values ('secret')", ['secret'], driverError)
    const logged = serializeError(error)
    expect(logged).toMatchObject({ type: 'QueryFailedError', code: '22P02', table: 'users' })
    expect(JSON.stringify(logged)).not.toContain('secret')
  })

  it('is the name, the message and the place of any other', () => {
    const logged = serializeError(new TypeError('x is not a function'))
    expect(logged).toMatchObject({ type: 'TypeError', message: 'x is not a function' })
    expect(logged.stack).toEqual(expect.arrayContaining([expect.stringContaining('logger.test.ts')]))
  })

  it('is only the type of what is no error', () => {
    expect(serializeError({ password: 'secret' })).toEqual({ type: 'object' })
  })
})
