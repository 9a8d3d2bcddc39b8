import { render, screen } from '@testing-library/react'
import { describe, expect, it } from 'vitest'
import { LoadStrip } from '@/components/ui/load-strip'

const NBSP = '\u00a0'
const widths = (container: HTMLElement): Array<string | null> =>
  [...container.querySelectorAll('svg > rect')].map((rect) => rect.getAttribute('width'))

describe('LoadStrip', () => {
  it('says joint, share and cap in words', () => {
    render(<LoadStrip label="Right elbow" share={0.31} cap={0.5} />)
    expect(screen.getByRole('img', { name: `Right elbow 31${NBSP}% of strength, cap 50${NBSP}%` })).toBeInTheDocument()
  })

  it('shows the number with its unit', () => {
    render(<LoadStrip label="Wrist" share={0.14} />)
    expect(screen.getByText('14 %')).toBeInTheDocument()
  })

  it('fills by length, in oxide for load and lichen for drive', () => {
    const load = render(<LoadStrip label="Wrist" share={0.42} />).container
    expect(widths(load)).toEqual(['100%', '42%'])
    expect(load.querySelectorAll('rect')[1]).toHaveAttribute('fill', 'var(--oxide)')
    const drive = render(<LoadStrip label="Lats" share={0.9} kind="drive" />).container
    expect(drive.querySelectorAll('rect')[1]).toHaveAttribute('fill', 'var(--lichen)')
    expect(screen.getByRole('img', { name: `Lats 90${NBSP}% of its limit` })).toBeInTheDocument()
  })

  it('hatches what lies past the cap, and nothing below it', () => {
    const over = render(<LoadStrip label="Elbow" share={0.71} cap={0.5} />).container
    expect(over.querySelector('pattern')).not.toBeNull()
    expect(widths(over).slice(1, 3)).toEqual(['50%', '21%'])
    const under = render(<LoadStrip label="Elbow" share={0.49} cap={0.5} />).container
    expect(under.querySelector('pattern')).toBeNull()
  })

  it('ends the bar at 100 % but tells the true number', () => {
    const { container } = render(<LoadStrip label="Elbow" share={1.34} cap={0.5} />)
    expect(screen.getByText('134 %')).toBeInTheDocument()
    expect(widths(container).slice(1, 3)).toEqual(['50%', '50%'])
  })

  it('stays whole without strength to spare or demand at all', () => {
    const { container } = render(<LoadStrip label="Elbow" share={0} cap={0} />)
    expect(container.innerHTML).not.toMatch(/NaN|-\d+%/)
  })
})
