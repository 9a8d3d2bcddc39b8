import { configure, screen, waitFor } from '@testing-library/react'
import { beforeEach, describe, expect, it, vi } from 'vitest'
import { Component as Catalogue } from '@/pages/catalogue'
import { Component as ExercisePage } from '@/pages/exercise'
import { Component as ExerciseSwaps } from '@/pages/exercise-swaps'
import { aList, anAthleteRow, aPerson, aPlace } from '../support/samples'
import { fakeApi, Refusal } from '../support/api'
import { renderPage } from '../support/render'
import { anExerciseOf, aPreview, aRanking, aSwapRow } from '../support/swap-samples'

// Whole pages with drawings take jsdom a while on a busy machine.
configure({ asyncUtilTimeout: 5_000 })

const pulldown = anExerciseOf('straightArmPulldown', 'Straight-arm cable pulldown')
const bench = anExerciseOf('benchPress', 'Bench press', {
  family: 'horizontalPush',
  equipment: ['barbell', 'flatBench'],
  coordination: 40,
})
const person = aPerson()
const PREVIEW = 'POST /api/exercises/preview'

beforeEach(() => {
  vi.unstubAllGlobals()
})

describe('the catalogue', () => {
  const open = (path = '/catalogue') => renderPage(<Catalogue />, { person, route: '/catalogue', path })

  it('lists exercises with family, equipment, the muscles driven most and coordination', async () => {
    fakeApi({ 'GET /api/exercises': aList(pulldown, bench) })
    open()
    const row = (await screen.findByRole('link', { name: 'Bench press' })).closest('tr')
    expect(row).toHaveTextContent('barbell and flat bench')
    expect(row).toHaveTextContent('latissimus, triceps long head')
    expect(row).toHaveTextContent('40')
    expect(screen.getByRole('link', { name: 'Bench press' })).toHaveAttribute('href', `/catalogue/${bench.slug}`)
  })

  it('keeps the search in the address and asks for it once typing rests', async () => {
    const { sent } = fakeApi({ 'GET /api/exercises': aList(pulldown) })
    const { user, router } = open()
    await user.type(await screen.findByLabelText('Search by name'), 'pulldown')
    await waitFor(() => expect(router.state.location.search).toBe('?search=pulldown'))
    await waitFor(() => expect(sent.at(-1)?.query.search).toBe('pulldown'))
    expect(sent.map(({ query }) => query.search)).toEqual([undefined, 'pulldown'])
  })

  it('says what to do when nothing is called that', async () => {
    fakeApi({ 'GET /api/exercises': aList() })
    open('/catalogue?search=zzz')
    expect(await screen.findByText('No exercise is called “zzz”.')).toBeInTheDocument()
  })

  it('fetches the next page on request', async () => {
    const { sent } = fakeApi({
      'GET /api/exercises': ({ query }: { query: Record<string, string> }) =>
        query.cursor === undefined ? { items: [pulldown], nextCursor: 'more' } : aList(bench),
    })
    const { user } = open()
    await user.click(await screen.findByRole('button', { name: 'Show more' }))
    expect(await screen.findByRole('link', { name: 'Bench press' })).toBeInTheDocument()
    expect(sent.at(-1)?.query.cursor).toBe('more')
  })
})

describe('an exercise', () => {
  const open = (as = person) =>
    renderPage(<ExercisePage />, { person: as, route: '/catalogue/:slug', path: `/catalogue/${pulldown.slug}` })
  const answers = {
    [`GET /api/exercises/${pulldown.slug}`]: pulldown,
    [PREVIEW]: aPreview(['start', 'middle', 'end']),
  }

  it('shows set-up, cautions, what it asks of each joint and the muscles it drives', async () => {
    fakeApi(answers)
    open()
    expect(await screen.findByText('Keep the ribs down.')).toBeInTheDocument()
    expect(
      await screen.findByRole('img', { name: 'Right elbow 30\u00a0% of strength, cap 50\u00a0%' }),
    ).toBeInTheDocument()
    expect(screen.getByRole('img', { name: 'Latissimus 84\u00a0% of its limit' })).toBeInTheDocument()
    expect(screen.getByText('shoulder extension', { selector: 'dd' })).toBeInTheDocument()
    expect(screen.getByText(/Strength is the average adult’s until bests are logged/)).toBeInTheDocument()
  })

  it('asks again at the load that was typed, and marks the figure with the answer', async () => {
    const { to } = fakeApi(answers)
    const { user } = open()
    const load = await screen.findByLabelText(/^Load in kg/)
    await user.clear(load)
    await user.type(load, '40{Enter}')
    await waitFor(() =>
      expect(to(PREVIEW).at(-1)?.body).toEqual({ exerciseId: pulldown.id, athleteId: person.id, load: 40 }),
    )
    expect(await screen.findByRole('img', { name: /cable pulldown, end\. Right shoulder 80/ })).toBeInTheDocument()
  })

  it('never asks for a load beyond what the exercise allows', async () => {
    const { to } = fakeApi(answers)
    const { user } = open()
    const load = await screen.findByLabelText(/^Load in kg/)
    await user.clear(load)
    await user.type(load, '900{Enter}')
    await waitFor(() => expect(to(PREVIEW).at(-1)?.body).toMatchObject({ load: 80 }))
  })

  it('takes pounds from those who use them', async () => {
    const { to } = fakeApi(answers)
    const { user } = open({ ...person, units: 'imperial' })
    const load = await screen.findByLabelText(/^Load in lb/)
    await user.clear(load)
    await user.type(load, '100{Enter}')
    await waitFor(() => expect(to(PREVIEW).at(-1)?.body).toMatchObject({ load: 45.359 }))
  })

  it('lets a coach choose whose numbers to see', async () => {
    const athlete = anAthleteRow({ name: 'Rufus Penhale' })
    const coach = aPerson({ body: null, memberships: [{ clubId: athlete.id, clubName: 'Quarry Lane', role: 'coach' }] })
    const { to } = fakeApi({ ...answers, 'GET /api/athletes': aList(athlete) })
    const { user } = open(coach)
    await waitFor(() => expect(to(PREVIEW).at(-1)?.body).toHaveProperty('body.sex', 'unspecified'))
    await user.selectOptions(await screen.findByLabelText('For'), 'Rufus Penhale')
    await waitFor(() => expect(to(PREVIEW).at(-1)?.body).toHaveProperty('athleteId', athlete.id))
    expect(screen.getByText(/Numbers are for Rufus Penhale/)).toBeInTheDocument()
  })

  it('leads to swaps for it with target, intent, sets, repetitions and RIR', async () => {
    fakeApi(answers)
    const { user, router } = open()
    await user.selectOptions(await screen.findByLabelText('Target'), 'chest')
    await user.clear(screen.getByLabelText('Sets'))
    await user.type(screen.getByLabelText('Sets'), '5')
    await user.click(screen.getByRole('button', { name: 'See swaps' }))
    await waitFor(() =>
      expect(router.state.location.pathname).toBe(`/athletes/${person.id}/exercises/${pulldown.id}/swaps`),
    )
    expect(router.state.location.search).toBe('?target=chest&intent=size&sets=5&repetitions=8&rir=2')
  })

  it('says which number cannot be used and keeps it', async () => {
    fakeApi(answers)
    const { user } = open()
    const sets = await screen.findByLabelText('Sets')
    await user.clear(sets)
    await user.type(sets, '99')
    await user.click(screen.getByRole('button', { name: 'See swaps' }))
    expect(await screen.findByText('Sets: give a whole number from 1 to 20.')).toBeInTheDocument()
    expect(sets).toHaveValue('99')
  })

  it('says when there is no such exercise', async () => {
    fakeApi({ [`GET /api/exercises/${pulldown.slug}`]: new Refusal(404, 'not_found') })
    open()
    expect(await screen.findByRole('heading', { name: 'No such exercise' })).toBeInTheDocument()
    expect(screen.getByRole('link', { name: 'To the catalogue' })).toHaveAttribute('href', '/catalogue')
  })
})

describe('swaps for any exercise', () => {
  const RANK = `GET /api/athletes/${person.id}/exercises/${pulldown.id}/swaps`
  const path = `/athletes/${person.id}/exercises/${pulldown.id}/swaps`
  const open = (query: string) =>
    renderPage(<ExerciseSwaps />, {
      person,
      route: '/athletes/:athleteId/exercises/:exerciseId/swaps',
      path: path + query,
    })
  const answers = {
    [RANK]: aRanking({ original: pulldown, items: [aSwapRow(bench.name, {}, bench)] }),
    'GET /api/places': aList(aPlace()),
    'GET /api/exercises': aList(pulldown, bench),
  }

  it('asks with what the address wants, and with sound values where it wants nonsense', async () => {
    const { to } = fakeApi(answers)
    open('?target=chest&intent=strength&sets=4&repetitions=5&rir=1')
    await screen.findByRole('table', { name: /Swaps for/ })
    expect(to(RANK)[0]?.query).toEqual({ target: 'chest', intent: 'strength', sets: '4', repetitions: '5', rir: '1' })
  })

  it('falls back to sound values when the address wants nonsense', async () => {
    const { to } = fakeApi(answers)
    open('?target=soul&sets=900&repetitions=-3&rir=x')
    await screen.findByRole('table', { name: /Swaps for/ })
    expect(to(RANK)[0]?.query).toEqual({ target: 'lats', intent: 'size', sets: '3', repetitions: '8', rir: '2' })
  })

  it('shows the table without anything to take or flag', async () => {
    fakeApi(answers)
    const { user } = open('')
    await user.click(await screen.findByRole('button', { name: 'Open Bench press' }))
    expect(screen.queryByRole('button', { name: /Take/ })).toBeNull()
    expect(screen.queryByRole('button', { name: /Flag/ })).toBeNull()
  })
})
