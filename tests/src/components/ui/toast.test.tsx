import { screen, waitFor } from '@testing-library/react'
import { expect, it, vi } from 'vitest'
import { Button } from '@/components/ui/button'
import { useToast } from '@/components/ui/toast'
import { renderPage } from '#tests/src/support/render'

function Speaker({ undo }: { undo: () => void }) {
  const toast = useToast()
  return (
    <>
      <Button onClick={() => toast({ text: 'First.' })}>one</Button>
      <Button onClick={() => toast({ text: 'Second.', action: { label: 'Undo', run: undo } })}>two</Button>
    </>
  )
}
/** The message itself, not its copy for screen readers. */
const message = (text: string) => screen.queryByText(text, { selector: 'li *' })

it('a message takes the place of the one before', async () => {
  const { user } = renderPage(<Speaker undo={() => undefined} />)
  await user.click(screen.getByRole('button', { name: 'one' }))
  expect(message('First.')).toBeInTheDocument()
  await user.click(screen.getByRole('button', { name: 'two' }))
  expect(message('Second.')).toBeInTheDocument()
  expect(message('First.')).not.toBeInTheDocument()
})

it('a message can be closed, and the next one is shown again', async () => {
  const { user } = renderPage(<Speaker undo={() => undefined} />)
  await user.click(screen.getByRole('button', { name: 'one' }))
  await user.click(screen.getByRole('button', { name: 'Close this message' }))
  await waitFor(() => expect(message('First.')).not.toBeInTheDocument())
  await user.click(screen.getByRole('button', { name: 'one' }))
  expect(message('First.')).toBeInTheDocument()
})

it('the way back runs once and takes the message away', async () => {
  const undo = vi.fn()
  const { user } = renderPage(<Speaker undo={undo} />)
  await user.click(screen.getByRole('button', { name: 'two' }))
  await user.click(screen.getByRole('button', { name: 'Undo' }))
  expect(undo).toHaveBeenCalledOnce()
  await waitFor(() => expect(message('Second.')).not.toBeInTheDocument())
})
