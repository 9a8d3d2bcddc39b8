import { screen, within } from '@testing-library/react'
import { afterEach, describe, expect, it, vi } from 'vitest'
import { SoreJointDialog } from '@/features/sore-joints/components/sore-joint-dialog'
import { fakeApi, Refusal } from '#tests/src/support/api'
import { renderPage } from '#tests/src/support/render'
import { aRedFlag, aSoreJoint } from '#tests/src/support/samples'

afterEach(() => vi.unstubAllGlobals())

const POST = 'POST /api/athletes/athlete-1/sore-joints'

function open(handlers: Parameters<typeof fakeApi>[0] = {}) {
  const api = fakeApi(handlers)
  const onClose = vi.fn()
  const onReported = vi.fn()
  const view = renderPage(
    <SoreJointDialog athleteId="athlete-1" day="2026-12-01" onClose={onClose} onReported={onReported} />,
  )
  return { ...view, api, onClose, onReported }
}
type Opened = ReturnType<typeof open>

/** Answers the six questions, “yes” to those whose words are given. */
async function answer({ user }: Opened, ...yes: RegExp[]) {
  for (const question of screen.getAllByRole('group')) {
    const words = question.querySelector('legend')?.textContent ?? ''
    const reply = yes.some((pattern) => pattern.test(words)) ? 'Yes' : 'No'
    await user.click(within(question).getByRole('radio', { name: reply }))
  }
  await user.click(screen.getByRole('button', { name: 'Continue' }))
}

async function describeElbow({ user }: Opened, rating = '4') {
  const front = await screen.findByRole('group', { name: 'Body from the front' })
  await user.click(within(front).getByRole('button', { name: 'Right elbow' }))
  await user.click(screen.getByRole('radio', { name: rating }))
  await user.click(screen.getByRole('checkbox', { name: 'Bending it under load' }))
  await user.click(screen.getByRole('button', { name: 'Save the report' }))
}

describe('red-flag questions', () => {
  it('come first, with no answer given beforehand', () => {
    open()
    const answers = screen.getAllByRole('radio')
    expect(answers).toHaveLength(12)
    for (const radio of answers) expect(radio).not.toBeChecked()
  })

  it('must all be answered before the joint is asked for', async () => {
    const view = open()
    const [first] = screen.getAllByRole('radio', { name: 'No' })
    await view.user.click(first!)
    await view.user.click(screen.getByRole('button', { name: 'Continue' }))
    expect(await screen.findAllByText('Answer yes or no.')).toHaveLength(5)
    expect(screen.queryByText('How sore, when you train it')).not.toBeInTheDocument()
  })

  it('answered yes bring the advice to stop at once, urgently where it is due, and the report is still saved', async () => {
    const view = open({ [POST]: () => aRedFlag({ redFlags: ['chestOrBreath'] }) })
    await answer(view, /chest pain/)
    expect(await screen.findByText('Stop, and see a licensed clinician.')).toBeInTheDocument()
    expect(screen.getByText(/call the emergency services now/)).toBeInTheDocument()
    await describeElbow(view)
    expect(await screen.findByText(/The coach and physio you have let in can see this report/)).toBeInTheDocument()
    expect(screen.getByText(/call the emergency services now/)).toBeInTheDocument()
    expect(view.api.to(POST)[0]?.body).toMatchObject({ redFlags: { chestOrBreath: true, nerve: false } })
    expect(view.onReported).not.toHaveBeenCalled()
  })

  it('are not the only way to a red flag: a rating of 8 brings the advice too', async () => {
    const view = open()
    await answer(view)
    expect(screen.queryByText('Stop, and see a licensed clinician.')).not.toBeInTheDocument()
    await view.user.click(await screen.findByRole('radio', { name: '8' }))
    expect(screen.getByText('Stop, and see a licensed clinician.')).toBeInTheDocument()
  })
})

describe('a report', () => {
  it('is sent as it was given', async () => {
    const view = open({ [POST]: () => aSoreJoint() })
    await answer(view)
    await describeElbow(view)
    await vi.waitFor(() => expect(view.onReported).toHaveBeenCalledOnce())
    expect(view.api.to(POST)[0]?.body).toEqual({
      joint: 'elbow',
      side: 'right',
      rating: 4,
      provocations: ['bending'],
      note: '',
      day: '2026-12-01',
      redFlags: {
        injury: false,
        nerve: false,
        swollenOrFever: false,
        nightPain: false,
        severePain: false,
        chestOrBreath: false,
      },
    })
  })

  it('says beside each question what is missing, and sends nothing', async () => {
    const view = open()
    await answer(view)
    await view.user.click(await screen.findByRole('button', { name: 'Save the report' }))
    expect(await screen.findByText('Choose a joint.')).toBeInTheDocument()
    expect(screen.getByText('Choose a number from 0 to 10.')).toBeInTheDocument()
    expect(screen.getByText('Choose at least one, or “I don’t know”.')).toBeInTheDocument()
    expect(view.api.sent).toEqual([])
  })

  it('keeps every answer when the server refuses it', async () => {
    const view = open({ [POST]: new Refusal(500, 'internal', 'Something broke on our side.') })
    await answer(view)
    await describeElbow(view)
    expect(await screen.findByText('Something broke on our side.')).toBeInTheDocument()
    expect(screen.getByRole('radio', { name: '4' })).toBeChecked()
    expect(screen.getByRole('checkbox', { name: 'Bending it under load' })).toBeChecked()
  })
})

describe('the joint', () => {
  it('shows as chosen in both views of the body', async () => {
    const view = open()
    await answer(view)
    const back = await screen.findByRole('group', { name: 'Body from the back' })
    await view.user.click(within(back).getByRole('button', { name: 'Left knee' }))
    for (const button of screen.getAllByRole('button', { name: 'Left knee' }))
      expect(button).toHaveAttribute('aria-pressed', 'true')
    expect(screen.getByRole('heading', { name: 'Where: left knee' })).toBeInTheDocument()
  })

  it('on the athlete’s right lies on the viewer’s left in front, and on the right behind', async () => {
    const view = open()
    await answer(view)
    const leftEdge = (group: string, joint: string) =>
      Number.parseFloat(
        within(screen.getByRole('group', { name: group })).getByRole('button', { name: joint }).style.left,
      )
    await screen.findByRole('group', { name: 'Body from the front' })
    expect(leftEdge('Body from the front', 'Right elbow')).toBeLessThan(50)
    expect(leftEdge('Body from the back', 'Right elbow')).toBeGreaterThan(50)
  })

  it('can be chosen from a list instead, midline joints without a side', async () => {
    const view = open()
    await answer(view)
    await view.user.click(await screen.findByRole('button', { name: 'choose from a list instead' }))
    const list = screen.getByRole('combobox', { name: 'Joint' })
    expect(within(list).getAllByRole('option')).toHaveLength(15)
    await view.user.selectOptions(list, 'Lower back')
    expect(screen.getByRole('heading', { name: 'Where: lower back' })).toBeInTheDocument()
  })

  it('decides which provocations are asked for', async () => {
    const view = open()
    await answer(view)
    const front = await screen.findByRole('group', { name: 'Body from the front' })
    await view.user.click(screen.getByRole('checkbox', { name: 'Gripping' }))
    await view.user.click(within(front).getByRole('button', { name: 'Left knee' }))
    expect(screen.queryByRole('checkbox', { name: 'Gripping' })).not.toBeInTheDocument()
    await view.user.click(within(front).getByRole('button', { name: 'Left wrist' }))
    expect(screen.getByRole('checkbox', { name: 'Gripping' })).not.toBeChecked()
  })

  it('whose provocation is not known has no other', async () => {
    const view = open()
    await answer(view)
    await view.user.click(await screen.findByRole('checkbox', { name: 'Twisting' }))
    await view.user.click(screen.getByRole('checkbox', { name: 'I don’t know' }))
    expect(screen.getByRole('checkbox', { name: 'Twisting' })).not.toBeChecked()
    await view.user.click(screen.getByRole('checkbox', { name: 'Twisting' }))
    expect(screen.getByRole('checkbox', { name: 'I don’t know' })).not.toBeChecked()
  })
})

describe('closing', () => {
  it('untouched closes at once', async () => {
    const { user, onClose } = open()
    await user.click(screen.getByRole('button', { name: 'Close' }))
    expect(onClose).toHaveBeenCalledOnce()
  })

  it('with answers asks first, and keeps them when told to', async () => {
    const { user, onClose } = open()
    await user.click(screen.getAllByRole('radio', { name: 'No' })[0]!)
    await user.keyboard('{Escape}')
    const question = await screen.findByRole('alertdialog', { name: 'Leave without saving?' })
    await user.click(within(question).getByRole('button', { name: 'Keep answering' }))
    expect(onClose).not.toHaveBeenCalled()
    expect(screen.getAllByRole('radio', { name: 'No' })[0]).toBeChecked()
    await user.click(screen.getByRole('button', { name: 'Close' }))
    await user.click(await screen.findByRole('button', { name: 'Leave' }))
    expect(onClose).toHaveBeenCalledOnce()
  })
})
