import { screen, waitFor, within } from '@testing-library/react'
import { afterEach, describe, expect, it, vi } from 'vitest'
import { Component as JointsPage } from '@/pages/joints'
import { fakeApi, Refusal, type Sent } from '#tests/src/support/api'
import { renderPage } from '#tests/src/support/render'
import { aList, aPerson, aRedFlag, aSoreJoint } from '#tests/src/support/samples'
import type { SoreJoint } from '#shared/contract/sore-joint'

afterEach(() => vi.unstubAllGlobals())

const person = aPerson()
const LIST = `GET /api/athletes/${person.id}/sore-joints`

function open(standing: SoreJoint[], closed: SoreJoint[] = [], handlers: Parameters<typeof fakeApi>[0] = {}) {
  const api = fakeApi({
    [LIST]: ({ query }: Sent) => (query.state === 'standing' ? aList(...standing) : aList(...closed)),
    ...handlers,
  })
  return { api, ...renderPage(<JointsPage />, { person }) }
}

describe('standing reports', () => {
  it('show rating, what provokes the joint and the note', async () => {
    open([aSoreJoint({ note: 'Since Thursday.', provocations: ['bending', 'gripping'] })])
    const card = (await screen.findByRole('heading', { name: 'Right elbow' })).closest('li')!
    expect(card).toHaveTextContent('4 of 10')
    expect(card).toHaveTextContent('bending it under load and gripping')
    expect(card).toHaveTextContent('Since Thursday.')
  })

  it('with a red flag say who clears it, and have no way for the athlete to close it', async () => {
    open([aRedFlag()])
    const card = (await screen.findByRole('heading', { name: 'Right elbow' })).closest('li')!
    expect(card).toHaveTextContent('until your physio clears it; you cannot clear it yourself')
    expect(within(card).queryByRole('button')).not.toBeInTheDocument()
  })

  it('say so when there are none', async () => {
    open([])
    expect(await screen.findByText('No joint is marked as sore.')).toBeInTheDocument()
    expect(await screen.findByText('No earlier reports.')).toBeInTheDocument()
  })
})

describe('closing a report', () => {
  const report = aSoreJoint()
  const CLOSE = `POST /api/athletes/${person.id}/sore-joints/${report.id}/closure`

  it('takes it from the list at once', async () => {
    let release: () => void = () => undefined
    const { user } = open([report], [], { [CLOSE]: () => new Promise((resolve) => (release = () => resolve(report))) })
    await user.click(await screen.findByRole('button', { name: 'It no longer troubles me' }))
    await waitFor(() => expect(screen.queryByRole('heading', { name: 'Right elbow' })).not.toBeInTheDocument())
    release()
    expect(await screen.findByText('Right elbow closed.')).toBeInTheDocument()
  })

  it('puts it back and says why when the server refuses', async () => {
    const { user } = open([report], [], {
      [CLOSE]: new Refusal(409, 'already_closed', 'This report was closed already.'),
    })
    await user.click(await screen.findByRole('button', { name: 'It no longer troubles me' }))
    expect(await screen.findByText('This report was closed already.')).toBeInTheDocument()
    expect(screen.getByRole('heading', { name: 'Right elbow' })).toBeInTheDocument()
  })
})

it('earlier reports come page by page', async () => {
  const wrist = aSoreJoint({ joint: 'wrist', side: 'left', state: 'closed' })
  const back = aSoreJoint({ joint: 'lowerBack', side: null, state: 'closed' })
  const { user } = open([], [], {
    [LIST]: ({ query }: Sent) => {
      if (query.state === 'standing') return aList()
      return query.cursor === 'next' ? aList(back) : { ...aList(wrist), nextCursor: 'next' }
    },
  })
  await screen.findByText('Left wrist')
  expect(screen.queryByText('Lower back')).not.toBeInTheDocument()
  await user.click(screen.getByRole('button', { name: 'Show more' }))
  expect(await screen.findByText('Lower back')).toBeInTheDocument()
  expect(screen.queryByRole('button', { name: 'Show more' })).not.toBeInTheDocument()
})
