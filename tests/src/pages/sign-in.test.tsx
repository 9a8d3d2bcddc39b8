import { screen, waitFor } from '@testing-library/react'
import { afterEach, describe, expect, it, vi } from 'vitest'
import { Component as SignInPage } from '@/pages/sign-in'
import { fakeApi, Refusal } from '#tests/src/support/api'
import { renderPage } from '#tests/src/support/render'
import { aList, aPerson } from '#tests/src/support/samples'

afterEach(() => vi.unstubAllGlobals())

const POST = 'POST /api/auth/sign-in'
const demo = {
  name: 'Ilse Tamm',
  email: 'ilse@pintle.example',
  password: 'spare the joint',
  role: 'athlete',
  clubName: 'Quarry Lane',
}

function open(handlers: Parameters<typeof fakeApi>[0] = {}, path = '/sign-in') {
  const api = fakeApi({ 'GET /api/auth/demo-accounts': aList(), ...handlers })
  return { api, ...renderPage(<SignInPage />, { path, route: '/sign-in' }) }
}
async function fillIn(
  user: ReturnType<typeof open>['user'],
  email = 'ilse@pintle.example',
  password = 'spare the joint',
) {
  await user.type(screen.getByRole('textbox', { name: 'E-mail' }), email)
  await user.type(screen.getByLabelText('Password'), password)
  await user.click(screen.getByRole('button', { name: 'Sign in' }))
}

describe('signing in', () => {
  it.each([
    ['/sign-in?next=%2Fjoints', '/joints'],
    ['/sign-in', '/'],
    ['/sign-in?next=%2F%2Felsewhere.example', '/'],
    ['/sign-in?next=https%3A%2F%2Felsewhere.example', '/'],
    ['/sign-in?next=%2F%5Celsewhere.example', '/'],
    ['/sign-in?next=%2F%09%2Felsewhere.example', '/'],
  ])('from %s leads to %s, never off the site', async (path, target) => {
    const { user, router } = open({ [POST]: aPerson() }, path)
    await fillIn(user)
    await waitFor(() => expect(router.state.location.pathname).toBe(target))
  })

  it('with the wrong password says so and keeps the address', async () => {
    const { user } = open({ [POST]: new Refusal(401, 'wrong_credentials', 'E-mail or password is wrong.') })
    await fillIn(user)
    expect(await screen.findByText('E-mail or password is wrong.')).toBeInTheDocument()
    expect(screen.getByRole('textbox', { name: 'E-mail' })).toHaveValue('ilse@pintle.example')
  })

  it('with something missing asks for it and sends nothing', async () => {
    const { api, user } = open()
    await user.click(screen.getByRole('button', { name: 'Sign in' }))
    expect(await screen.findByText('Enter your password.')).toBeInTheDocument()
    expect(screen.getByRole('textbox', { name: 'E-mail' })).toBeInvalid()
    expect(api.to(POST)).toEqual([])
  })
})

describe('demo accounts', () => {
  it('fill in the form when one is chosen', async () => {
    const { user } = open({ 'GET /api/auth/demo-accounts': aList(demo) })
    await user.click(await screen.findByRole('button', { name: /Ilse Tamm/ }))
    expect(screen.getByRole('textbox', { name: 'E-mail' })).toHaveValue(demo.email)
    expect(screen.getByLabelText('Password')).toHaveValue(demo.password)
    expect(screen.getByRole('button', { name: 'Sign in' })).toHaveFocus()
  })

  it('are listed once for each person, with all their clubs', async () => {
    open({ 'GET /api/auth/demo-accounts': aList(demo, { ...demo, clubName: 'Saltmarsh' }) })
    expect(await screen.findByText('Quarry Lane, Saltmarsh')).toBeInTheDocument()
    expect(screen.getAllByRole('button', { name: /Ilse Tamm/ })).toHaveLength(1)
  })

  it('are not spoken of outside a demo', async () => {
    const { api } = open()
    await waitFor(() => expect(api.sent).toHaveLength(1))
    expect(screen.queryByText('Demo accounts')).not.toBeInTheDocument()
  })
})
