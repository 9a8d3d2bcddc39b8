import { render, screen } from '@testing-library/react'
import { describe, expect, it } from 'vitest'
import { solveExercise } from '#shared/mechanics/index'
import { SAMPLE_MECHANICS } from '#tests/support/sample-mechanics'
import { Figure } from '@/components/figure/figure'
import { FigureStrip, shownFrames } from '@/components/figure/figure-strip'

const mechanics = SAMPLE_MECHANICS.straightArmPulldown
const { frames } = solveExercise(mechanics, 'female')
const elbow = { joint: 'elbow', side: 'right', stress: 0.31, cap: 0.5 } as const

describe('Figure', () => {
  it('says in words what it shows: exercise, posture, joints and caps', () => {
    render(<Figure name="Straight-arm pulldown" mechanics={mechanics} frames={frames} marks={[elbow]} />)
    expect(
      screen.getByRole('img', {
        name: 'Straight-arm pulldown, middle. Right elbow 31\u00a0% of strength, cap 50\u00a0%.',
      }),
    ).toBeInTheDocument()
  })

  it('draws a disc for the demand and a dashed ring for the cap', () => {
    const { container } = render(<Figure name="x" mechanics={mechanics} frames={frames} marks={[elbow]} />)
    const [disc, ring] = container.querySelectorAll('circle')
    expect(disc).toHaveAttribute('fill', 'var(--oxide)')
    expect(ring).toHaveAttribute('stroke-dasharray')
  })

  it('prints in black on white without theme colours', () => {
    const { container } = render(<Figure name="x" mechanics={mechanics} frames={frames} marks={[elbow]} tone="print" />)
    expect(container.innerHTML).not.toContain('var(')
  })
})

describe('FigureStrip', () => {
  it('shows start, middle and end in order, with one scale', () => {
    const { container } = render(<FigureStrip name="Pulldown" mechanics={mechanics} frames={frames} />)
    expect(screen.getAllByRole('listitem').map((item) => item.querySelector('p')!.textContent)).toEqual([
      'start',
      'middle',
      'end',
    ])
    expect(new Set([...container.querySelectorAll('svg')].map((svg) => svg.getAttribute('viewBox'))).size).toBe(1)
  })

  it('never repeats a posture', () => {
    expect([1, 2, 3, 4].map(shownFrames)).toEqual([[0], [0, 1], [0, 1, 2], [0, 2, 3]])
  })
})
