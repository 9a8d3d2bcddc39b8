import { configure, screen, waitFor, within } from '@testing-library/react'
import { beforeEach, describe, expect, it, vi } from 'vitest'
import { ERROR_STATUS, type ErrorCode } from '#shared/contract/error-codes'
import { Component } from '@/pages/swaps'
import { aFlag, aList, aPerson, aPlace, anExercise } from '../support/samples'
import { fakeApi, Refusal, type Sent } from '../support/api'
import { renderPage } from '../support/render'
import { anExerciseOf, aPreview, aRanking, aSwapRow, aTakenSwap } from '../support/swap-samples'

// Whole pages with drawings take jsdom a while on a busy machine.
configure({ asyncUtilTimeout: 5_000 })

const person = aPerson()
const slotId = anExercise('slot').id
const pulldown = anExerciseOf('straightArmPulldown', 'Straight-arm cable pulldown')
const bench = anExerciseOf('benchPress', 'Bench press')
const place = aPlace({ name: 'Quarry Lane yard' })
const original = anExercise('Pull-up, overhand')
const items = [
  aSwapRow(pulldown.name, { rank: 1, score: 82 }, pulldown),
  aSwapRow(
    bench.name,
    {
      rank: 2,
      score: 63,
      targetDrive: 0.2,
      joints: [
        { joint: 'elbow', side: 'right', stress: 0.05, cap: 0.5 },
        { joint: 'wrist', side: null, stress: 0.3, cap: null },
        { joint: 'lowerBack', side: null, stress: 0.02, cap: null },
      ],
    },
    bench,
  ),
]
const full = aRanking({ athlete: { id: person.id, name: person.name }, original, items, placeId: place.id })

const RANK = `GET /api/slots/${slotId}/swaps`
const TAKE = `POST /api/slots/${slotId}/swaps`
const failing = (code: ErrorCode, message?: string) => new Refusal(ERROR_STATUS[code], code, message)

const answers = (over: Record<string, unknown> = {}) => ({
  [RANK]: full,
  'GET /api/places': aList(place, aPlace({ name: 'Saltmarsh room' })),
  'GET /api/exercises': aList(pulldown, bench),
  'POST /api/exercises/preview': aPreview(['start', 'middle', 'end']),
  ...over,
})
const open = (query = '') =>
  renderPage(<Component />, { person, route: '/slots/:slotId/swaps', path: `/slots/${slotId}/swaps${query}` })
const rowNames = () =>
  screen
    .getAllByRole('rowheader')
    .map((cell) => cell.textContent ?? '')
    .filter((text) => /pulldown|Bench/.test(text))

beforeEach(() => {
  vi.unstubAllGlobals()
  // Radix asks for it when a message is swiped; jsdom has no pointers to capture.
  Element.prototype.hasPointerCapture ??= () => false
})

describe('the swap page', () => {
  it('says what is replaced, what was planned and wanted, and which joint binds it', async () => {
    fakeApi(answers())
    open()
    expect(
      await screen.findByRole('heading', { level: 1, name: 'Instead of the pull-up, overhand' }),
    ).toBeInTheDocument()
    expect(screen.getByText('4 × 6 at RIR 2, 5 kg', { selector: 'dd' })).toBeInTheDocument()
    expect(screen.getByText('lats, for strength')).toBeInTheDocument()
    expect(screen.getByText('right elbow 4 of 10, bending it under load')).toBeInTheDocument()
    expect(
      screen.getByText('cap 50 % of its strength where that provokes it, 75 % for its other work'),
    ).toBeInTheDocument()
  })

  it('shows the caution in full in every state, with no way to dismiss it', async () => {
    fakeApi(answers({ [RANK]: failing('not_found', 'That slot does not exist.') }))
    open()
    await screen.findByText('That slot does not exist.')
    const caution = screen.getByRole('complementary', { name: 'Caution' })
    expect(caution).toHaveTextContent('not medical advice')
    expect(within(caution).queryByRole('button')).toBeNull()
  })

  it('lists the swaps best first, with a strip for the target and each joint', async () => {
    fakeApi(answers())
    open()
    const table = await screen.findByRole('table', { name: 'Swaps for Pull-up, overhand' })
    expect(rowNames()).toEqual([expect.stringContaining('pulldown'), expect.stringContaining('Bench press')])
    expect(
      within(table).getByRole('img', { name: 'Right elbow 31\u00a0% of strength, cap 50\u00a0%' }),
    ).toBeInTheDocument()
    expect(within(table).getByRole('img', { name: 'Lats 84\u00a0% of its limit' })).toBeInTheDocument()
    expect(screen.getByRole('status', { name: '' })).toHaveTextContent('2 swaps, 1 left out')
  })

  it('sorts by a joint, lightest first, and tells screen readers', async () => {
    fakeApi(answers())
    const { user } = open()
    const header = await screen.findByRole('columnheader', { name: /Elbow, right/ })
    await user.click(within(header).getByRole('button'))
    expect(header).toHaveAttribute('aria-sort', 'ascending')
    expect(rowNames()[0]).toContain('Bench press')
    await user.click(within(header).getByRole('button'))
    expect(header).toHaveAttribute('aria-sort', 'descending')
    expect(rowNames()[0]).toContain('pulldown')
  })

  it('opens a row by keyboard for the sentence, the factors and the figure at its load', async () => {
    const { sent } = fakeApi(answers())
    const { user } = open()
    const button = await screen.findByRole('button', { name: 'Open Straight-arm cable pulldown' })
    button.focus()
    await user.keyboard('{Enter}')
    expect(await screen.findByText(/The lats end the set at 84 %/)).toBeInTheDocument()
    expect(screen.getByRole('row', { name: /carry-over 0.99 shoulder works as in the pull-up/ })).toBeInTheDocument()
    expect(
      await screen.findByRole('img', { name: /Straight-arm cable pulldown, end\. Shoulder|, end\. Right shoulder 80/ }),
    ).toBeInTheDocument()
    const asked = sent.find(({ path }) => path === '/api/exercises/preview')
    expect(asked?.body).toEqual({ exerciseId: pulldown.id, athleteId: person.id, load: 22.5 })
  })

  it('asks for all figures in one batch', async () => {
    const { sent } = fakeApi(answers())
    open()
    await screen.findByRole('table', { name: /Swaps for/ })
    await waitFor(() => expect(sent.filter(({ path }) => path === '/api/exercises')).toHaveLength(1))
    const ids = sent.find(({ path }) => path === '/api/exercises')!.query.ids!.split(',')
    expect(ids.toSorted()).toEqual([original.id, pulldown.id, bench.id].toSorted())
  })

  it('keeps the filters in the address and sends them', async () => {
    const { sent } = fakeApi(answers())
    const { user, router } = open()
    await user.selectOptions(await screen.findByLabelText('Path'), 'cable')
    await waitFor(() => expect(router.state.location.search).toBe('?path=cable'))
    await waitFor(() => expect(sent.at(-1)?.query.guidance).toBe('cable'))
    await user.selectOptions(screen.getByLabelText('Place'), 'Saltmarsh room')
    await waitFor(() => expect(sent.at(-1)?.query.placeId).toBeDefined())
    expect(router.state.location.search).toContain('path=cable')
  })

  it('passes over filters in the address that cannot be filters', async () => {
    const { sent } = fakeApi(answers())
    open('?path=teleport&place=here&coordination=many')
    await screen.findByRole('table', { name: /Swaps for/ })
    const asked = sent.find(({ path }) => path.endsWith('/swaps'))!
    expect(Object.keys(asked.query)).toEqual([])
  })

  it('lists what was left out with its reason', async () => {
    fakeApi(answers())
    const { user } = open()
    await user.click(await screen.findByText('Left out, 1, each with its reason'))
    expect(screen.getByText('Right elbow at 71 % even with body weight alone; the cap is 50 %.')).toBeVisible()
  })

  it('says when numbers are an average adult’s, and when the athlete is under 18', async () => {
    fakeApi(answers({ [RANK]: { ...full, estimated: true, minor: true } }))
    open()
    expect(await screen.findByText('Numbers are for an average adult until bests are logged.')).toBeInTheDocument()
    expect(screen.getByText(/the strength norms behind these numbers are not valid for minors/)).toBeInTheDocument()
  })

  it('compares with the original as planned, and says when that is beyond current strength', async () => {
    fakeApi(answers({ [RANK]: { ...full, originalRow: null } }))
    open()
    expect(await screen.findByText(/beyond current strength, so there is nothing to compare with/)).toBeInTheDocument()
  })

  it('under a red flag offers nothing, says to stop, and that the care team was told', async () => {
    const flagged = {
      ...full,
      items: [],
      redFlags: [{ soreJointId: original.id, joint: 'elbow', side: 'right', flags: ['nerve'], urgent: true }],
    }
    fakeApi(answers({ [RANK]: flagged }))
    open()
    expect(await screen.findByText('Stop, and see a licensed clinician.')).toBeInTheDocument()
    expect(screen.getByText('The care team you have let in has been told.')).toBeInTheDocument()
    expect(screen.queryByRole('button', { name: /Take/ })).toBeNull()
    expect(screen.queryByLabelText('Path')).toBeNull()
    expect(screen.queryByText('No swap fits.')).toBeNull()
  })

  it('says what to do when no swap fits, and can clear the filters', async () => {
    fakeApi(answers({ [RANK]: { ...full, items: [] } }))
    const { user, router } = open('?path=cable')
    await user.click(await screen.findByRole('button', { name: 'Clear path and coordination' }))
    await waitFor(() => expect(router.state.location.search).toBe(''))
  })

  it('sends athletes without a body profile to fill it in', async () => {
    fakeApi(answers({ [RANK]: failing('profile_incomplete') }))
    open()
    expect(await screen.findByRole('link', { name: 'Fill them in' })).toHaveAttribute('href', '/me')
  })

  it('tries again after a failure', async () => {
    let tries = 0
    fakeApi(
      answers({
        [RANK]: () => ((tries += 1) === 1 ? failing('too_many_requests', 'Wait a moment.') : full),
      }),
    )
    const { user } = open()
    await user.click(await screen.findByRole('button', { name: 'Try again' }))
    expect(await screen.findByRole('table', { name: /Swaps for/ })).toBeInTheDocument()
  })
})

describe('taking a swap', () => {
  const taken = aTakenSwap({ slotId, exercise: pulldown })
  const take = async (over: Record<string, unknown>): Promise<{ sent: Sent[] } & ReturnType<typeof open>> => {
    const { sent } = fakeApi(answers(over))
    const view = open()
    await view.user.click(await screen.findByRole('button', { name: 'Take Straight-arm cable pulldown' }))
    return { sent, ...view }
  }

  it('sends the exercise and the fingerprint, says so with a way back, and returns to Today', async () => {
    const { sent, router } = await take({ [TAKE]: taken })
    expect(
      await screen.findByText(/Straight-arm cable pulldown is in for today: 3 × 12 at RIR 2, 22.5 kg/),
    ).toBeInTheDocument()
    expect(sent.find(({ method, path }) => method === 'POST' && path.endsWith('/swaps'))?.body).toEqual({
      exerciseId: pulldown.id,
      fingerprint: 'fingerprint-one',
    })
    await waitFor(() => expect(router.state.location.pathname).toBe('/today'))
  })

  it('can be undone from the message', async () => {
    const { sent, user } = await take({
      [TAKE]: taken,
      [`POST /api/swaps/${taken.id}/undo`]: { ...taken, undoneAt: taken.takenAt },
    })
    const button = await screen.findByRole('button', { name: 'Undo' })
    // The message takes the pointer only once it has settled in its place.
    await waitFor(() => user.click(button))
    // Beside the message stands its copy for screen readers, for a moment.
    expect(await screen.findByText(/the planned exercise is back/, { selector: 'li *' })).toBeInTheDocument()
    expect(sent.some(({ path }) => path === `/api/swaps/${taken.id}/undo`)).toBe(true)
  })

  it('reloads a table that changed meanwhile and says that nothing was taken', async () => {
    const { sent } = await take({ [TAKE]: failing('ranking_changed') })
    expect(await screen.findByText(/nothing was taken\. The table below is up to date/)).toBeInTheDocument()
    await waitFor(() =>
      expect(sent.filter(({ method, path }) => method === 'GET' && path.endsWith('/swaps')).length).toBeGreaterThan(1),
    )
  })

  it('says when another swap already stands', async () => {
    await take({ [TAKE]: failing('swap_already_taken') })
    expect(await screen.findByText(/Another swap already stands in this slot/)).toBeInTheDocument()
  })

  it('shows the reason of any other refusal and can be tried again', async () => {
    await take({ [TAKE]: failing('not_a_swap', 'That exercise is not offered here.') })
    expect(await screen.findByText('That exercise is not offered here.')).toBeInTheDocument()
    expect(screen.getByRole('button', { name: 'Take Straight-arm cable pulldown' })).toBeEnabled()
  })
})

describe('flagging a swap', () => {
  const openDialog = async (over: Record<string, unknown> = {}) => {
    const { sent } = fakeApi(answers(over))
    const view = open()
    await view.user.click(await screen.findByRole('button', { name: 'Open Straight-arm cable pulldown' }))
    await view.user.click(await screen.findByRole('button', { name: 'Flag this swap' }))
    return { sent, ...view }
  }

  it('asks for a reason before it sends anything', async () => {
    const { sent, user } = await openDialog()
    await user.click(screen.getByRole('button', { name: 'Send the flag' }))
    expect(await screen.findByText('Choose what is wrong with it.')).toBeInTheDocument()
    expect(sent.some(({ path }) => path === '/api/flags')).toBe(false)
  })

  it('sends slot, exercise, reason and note, and says so', async () => {
    const { sent, user } = await openDialog({ 'POST /api/flags': aFlag() })
    await user.click(screen.getByRole('radio', { name: 'it hurts' }))
    await user.type(screen.getByLabelText('Note, if it helps'), 'Inner side of the elbow.')
    await user.click(screen.getByRole('button', { name: 'Send the flag' }))
    expect(await screen.findByText('The flag is on its way to an admin.')).toBeInTheDocument()
    expect(sent.find(({ path }) => path === '/api/flags')?.body).toEqual({
      slotId,
      exerciseId: pulldown.id,
      reason: 'hurts',
      note: 'Inner side of the elbow.',
    })
  })

  it('keeps what was typed when sending fails', async () => {
    const { user } = await openDialog({ 'POST /api/flags': failing('unavailable', 'Not now.') })
    await user.click(screen.getByRole('radio', { name: 'the load is off' }))
    await user.type(screen.getByLabelText('Note, if it helps'), 'Too heavy.')
    await user.click(screen.getByRole('button', { name: 'Send the flag' }))
    expect(await screen.findByText('Not now.')).toBeInTheDocument()
    expect(screen.getByLabelText('Note, if it helps')).toHaveValue('Too heavy.')
  })
})
