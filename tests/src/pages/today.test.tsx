import { screen, within } from '@testing-library/react'
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest'
import type { Slot } from '#shared/contract/session'
import { Component as TodayPage } from '@/pages/today'
import { fakeApi, Refusal } from '#tests/src/support/api'
import { renderPage } from '#tests/src/support/render'
import {
  aDose,
  aList,
  anExercise,
  aPerson,
  aRedFlag,
  aSession,
  aSlot,
  aSoreJoint,
  aToday,
} from '#tests/src/support/samples'

beforeEach(() => vi.useFakeTimers({ toFake: ['Date'], now: new Date('2026-12-01T08:00:00') }))
afterEach(() => {
  vi.useRealTimers()
  vi.unstubAllGlobals()
})

const person = aPerson()
const TODAY = `GET /api/athletes/${person.id}/today`
const STANDING = `GET /api/athletes/${person.id}/sore-joints`

function open(slots: Slot[] | null, handlers: Parameters<typeof fakeApi>[0] = {}) {
  const session = slots && aSession({ athleteId: person.id, slots })
  const api = fakeApi({ [TODAY]: aToday(session), [STANDING]: aList(), 'GET /api/exercises': aList(), ...handlers })
  return { api, ...renderPage(<TodayPage />, { person }) }
}
const cardOf = async (name: string) => (await screen.findByRole('heading', { name })).closest('li')!

describe('today’s session', () => {
  it('is asked for the calendar day where the athlete is', async () => {
    const { api } = open([aSlot()])
    await cardOf('Pull-up, overhand')
    expect(api.to(TODAY)[0]?.query).toEqual({ day: '2026-12-01' })
    expect(screen.getByText('Tuesday 1 December · Pull day, 55 min')).toBeInTheDocument()
  })

  it('stands in the order it is trained in', async () => {
    open([aSlot({ position: 2, exercise: anExercise('Row') }), aSlot({ position: 1, exercise: anExercise('Dip') })])
    await cardOf('Row')
    expect(screen.getAllByRole('heading', { level: 2 }).map(({ textContent }) => textContent)).toEqual(['Dip', 'Row'])
  })

  it('says what a sore joint would reach and leads to the swaps', async () => {
    const slot = aSlot({
      affected: [{ joint: 'elbow', side: 'right', stress: 0.71, cap: 0.5, verdict: 'overCap', soreJointId: 's' }],
    })
    open([slot], { [STANDING]: aList(aSoreJoint()) })
    const card = await cardOf('Pull-up, overhand')
    expect(card).toHaveTextContent('Right elbow would reach 71 %, cap 50 %.')
    expect(within(card).getByRole('link', { name: 'See swaps for Pull-up, overhand' })).toHaveAttribute(
      'href',
      `/slots/${slot.id}/swaps`,
    )
    expect(await screen.findByText('4 of 10')).toBeInTheDocument()
  })

  it('offers no swaps for a joint with a red flag', async () => {
    open(
      [
        aSlot({
          affected: [{ joint: 'elbow', side: 'right', stress: 0.71, cap: 0, verdict: 'redFlag', soreJointId: 's' }],
        }),
      ],
      {
        [STANDING]: aList(aRedFlag()),
      },
    )
    const card = await cardOf('Pull-up, overhand')
    expect(card).toHaveTextContent('Right elbow: red flag. No swaps until a clinician has seen it.')
    expect(within(card).queryByRole('link')).not.toBeInTheDocument()
  })

  it('on a rest day says so, and when the next session is', async () => {
    open(null)
    expect(await screen.findByText('A rest day.')).toBeInTheDocument()
    expect(screen.getByText('The next session is on Thursday 3 December.')).toBeInTheDocument()
  })

  it('that cannot be loaded says why, with its code, and can be tried again', async () => {
    let broken = true
    const { user } = open([aSlot()], {
      [TODAY]: () =>
        broken ? new Refusal(403, 'forbidden', 'You may not see this.') : aToday(aSession({ slots: [aSlot()] })),
    })
    expect(await screen.findByText('You may not see this.')).toBeInTheDocument()
    expect(screen.getByText('forbidden')).toBeInTheDocument()
    broken = false
    await user.click(screen.getByRole('button', { name: 'Try again' }))
    expect(await cardOf('Pull-up, overhand')).toBeInTheDocument()
  })
})

describe('a swap that was taken', () => {
  const swap = {
    id: 'swap-1',
    exercise: anExercise('Straight-arm pulldown'),
    dose: aDose({ sets: 3, repetitions: 12, load: 22.5 }),
    takenAt: '2026-12-01T07:00:00.000Z',
    can: { undo: true },
  }

  it('stands in the slot with its own dose, and says what it replaces', async () => {
    open([aSlot({ swap })])
    const card = await cardOf('Straight-arm pulldown')
    expect(card).toHaveTextContent('3 × 12 at RIR 2, 22.5 kg')
    expect(card).toHaveTextContent('instead of Pull-up, overhand, 4 × 6 at RIR 2, 5 kg')
  })

  it('can be undone, and the session is read again', async () => {
    let undone = false
    const { api, user } = open([], {
      [TODAY]: () => aToday(aSession({ slots: [aSlot({ swap: undone ? null : swap })] })),
      'POST /api/swaps/swap-1/undo': () => {
        undone = true
        return { exercise: swap.exercise }
      },
    })
    await user.click(within(await cardOf('Straight-arm pulldown')).getByRole('button', { name: 'Undo the swap' }))
    expect(await cardOf('Pull-up, overhand')).toBeInTheDocument()
    expect(api.to('POST /api/swaps/swap-1/undo')).toHaveLength(1)
  })

  it('that this reader may not undo has no button for it', async () => {
    open([aSlot({ swap: { ...swap, can: { undo: false } } })])
    expect(within(await cardOf('Straight-arm pulldown')).queryByRole('button')).not.toBeInTheDocument()
  })
})
