import { screen, waitFor, within } from '@testing-library/react'
import { afterEach, describe, expect, it, vi } from 'vitest'
import type { Me } from '#shared/contract/me'
import { Component as MePage } from '@/pages/me'
import { fakeApi, Refusal, type Sent } from '#tests/src/support/api'
import { renderPage } from '#tests/src/support/render'
import { aList, aPerson, aPlace } from '#tests/src/support/samples'

afterEach(() => vi.unstubAllGlobals())

const coach = {
  userId: 'u1',
  name: 'Bram Oakes',
  role: 'coach',
  clubName: 'Quarry Lane',
  consentSince: '2026-09-07T09:00:00.000Z',
}

function open(change: Partial<Me> = {}, handlers: Parameters<typeof fakeApi>[0] = {}) {
  const person = aPerson(change)
  const api = fakeApi({
    'GET /api/places': aList(aPlace()),
    'GET /api/me/care-team': aList(coach),
    'PATCH /api/me': ({ body }: Sent) => ({ ...person, ...(body as object) }),
    ...handlers,
  })
  return { api, ...renderPage(<MePage />, { person }) }
}

describe('the body profile', () => {
  it('is typed and shown in the person’s units, and sent in the contract’s', async () => {
    const { api, user } = open({ units: 'imperial' })
    const mass = screen.getByRole('textbox', { name: 'Body mass in lb' })
    expect(mass).toHaveValue('135.6')
    expect(screen.getByRole('textbox', { name: 'Height in ft' })).toHaveValue('5')
    expect(screen.getByRole('textbox', { name: 'and inches in in' })).toHaveValue('6')
    await user.clear(mass)
    await user.type(mass, '140')
    await user.click(screen.getByRole('button', { name: 'Save the profile' }))
    await waitFor(() => expect(api.to('PATCH /api/me')).toHaveLength(1))
    expect(api.to('PATCH /api/me')[0]?.body).toEqual({
      body: { sex: 'female', bodyMass: 63.503, stature: 1.68, birthDate: '1996-03-14' },
    })
  })

  it('takes a decimal comma', async () => {
    const { api, user } = open()
    const mass = screen.getByRole('textbox', { name: 'Body mass in kg' })
    await user.clear(mass)
    await user.type(mass, '62,5')
    await user.click(screen.getByRole('button', { name: 'Save the profile' }))
    await waitFor(() => expect(api.to('PATCH /api/me')[0]?.body).toMatchObject({ body: { bodyMass: 62.5 } }))
  })

  it('says what is wrong in the person’s units, keeps what was typed, and sends nothing', async () => {
    const { api, user } = open()
    const mass = screen.getByRole('textbox', { name: 'Body mass in kg' })
    await user.clear(mass)
    await user.type(mass, '1000')
    await user.clear(screen.getByRole('textbox', { name: 'Height in cm' }))
    await user.click(screen.getByRole('button', { name: 'Save the profile' }))
    expect(await screen.findByText('Enter a body mass from 25 to 300 kg.')).toBeInTheDocument()
    expect(screen.getByText('Enter a height from 120 to 230 cm.')).toBeInTheDocument()
    expect(mass).toHaveValue('1000')
    expect(mass).toBeInvalid()
    expect(api.to('PATCH /api/me')).toEqual([])
  })

  it('is not asked of people who do not train', () => {
    open({ memberships: [{ clubId: 'c', clubName: 'Quarry Lane', role: 'coach' }], body: null })
    expect(screen.queryByRole('heading', { name: 'Body' })).not.toBeInTheDocument()
    expect(screen.queryByRole('heading', { name: 'Care team' })).not.toBeInTheDocument()
  })
})

describe('the care team', () => {
  const PUT = 'PUT /api/me/care-team/u1'
  const toggle = () => screen.findByRole('switch', { name: 'Let Bram Oakes in' })

  it('is asked about before somebody is shut out', async () => {
    const { api, user } = open()
    await user.click(await toggle())
    const question = await screen.findByRole('alertdialog', { name: 'Shut Bram Oakes out?' })
    await user.click(within(question).getByRole('button', { name: 'Keep letting in' }))
    expect(api.to(PUT)).toEqual([])
    expect(await toggle()).toBeChecked()
  })

  it('shuts out at once, and lets back in when the server refuses', async () => {
    let refuse: () => void = () => undefined
    const { api, user } = open(
      {},
      { [PUT]: () => new Promise((resolve) => (refuse = () => resolve(new Refusal(503, 'unavailable', 'Not now.')))) },
    )
    await user.click(await toggle())
    await user.click(await screen.findByRole('button', { name: 'Shut out' }))
    await waitFor(() => expect(screen.getByRole('switch')).not.toBeChecked())
    expect(api.to(PUT)[0]?.body).toEqual({ letIn: false })
    refuse()
    expect(await screen.findByText('Not now.')).toBeInTheDocument()
    expect(screen.getByRole('switch')).toBeChecked()
  })
})

it('the usual place is saved when it is chosen', async () => {
  const place = aPlace({ name: 'Saltmarsh room' })
  const { api, user } = open({}, { 'GET /api/places': aList(place) })
  await user.selectOptions(await screen.findByRole('combobox', { name: 'Usual place' }), 'Saltmarsh room')
  expect(await screen.findByText('Your usual place is saved.')).toBeInTheDocument()
  expect(api.to('PATCH /api/me')[0]?.body).toEqual({ defaultPlaceId: place.id })
})
