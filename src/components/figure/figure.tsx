import { useId, useMemo } from 'react'
import type { ExerciseMechanics } from '#shared/mechanics/definition'
import type { SolvedFrame } from '#shared/mechanics/solution'
import { describeFigure } from './describe'
import { drawExercise, type DrawnFrame, type Drawing } from './draw'
import { drawMarks, type Mark } from './marks'
import type { Ink, Shape } from './scene'

/** `print` is black on white whatever the theme: line, grey and pattern only. */
export type Tone = 'screen' | 'print'

interface Paint {
  fill: string
  stroke: string
  width: number
  dash?: string
  opacity?: number
}
const LINE = 0.7
const SCREEN: Record<Ink, Paint> = {
  ground: { fill: 'var(--rule)', stroke: 'var(--body-line)', width: 0.4 },
  pad: { fill: 'var(--wash)', stroke: 'var(--pencil)', width: 0.6 },
  iron: { fill: 'var(--pencil)', stroke: 'none', width: 0, opacity: 0.75 },
  plate: { fill: 'var(--pencil)', stroke: 'var(--ink)', width: 0.6, opacity: 0.22 },
  rod: { fill: 'var(--ink)', stroke: 'var(--card)', width: 0.35 },
  strap: { fill: 'none', stroke: 'var(--pencil)', width: 1.2 },
  band: { fill: 'none', stroke: 'var(--lichen)', width: 2 },
  wheel: { fill: 'none', stroke: 'var(--pencil)', width: 1.4 },
  bodyFar: {
    fill: 'color-mix(in srgb, var(--body) 62%, var(--card))',
    stroke: 'color-mix(in srgb, var(--body-line) 70%, var(--card))',
    width: LINE,
  },
  body: { fill: 'var(--body)', stroke: 'var(--body-line)', width: LINE },
  force: { fill: 'none', stroke: 'var(--slate)', width: 1.1, dash: '3.4 2' },
  forceHead: { fill: 'none', stroke: 'var(--slate)', width: 1.3 },
}
const PRINT: Record<Ink, Paint> = {
  ground: { fill: '#ddd', stroke: '#000', width: 0.4 },
  pad: { fill: '#eee', stroke: '#000', width: 0.6 },
  iron: { fill: '#555', stroke: 'none', width: 0 },
  plate: { fill: '#999', stroke: '#000', width: 0.7, opacity: 0.5 },
  rod: { fill: '#000', stroke: '#fff', width: 0.35 },
  strap: { fill: 'none', stroke: '#333', width: 1.2 },
  band: { fill: 'none', stroke: '#666', width: 2 },
  wheel: { fill: 'none', stroke: '#333', width: 1.4 },
  bodyFar: { fill: '#fff', stroke: '#777', width: LINE },
  body: { fill: '#fff', stroke: '#000', width: LINE },
  force: { fill: 'none', stroke: '#000', width: 1.1, dash: '3.4 2' },
  forceHead: { fill: 'none', stroke: '#000', width: 1.3 },
}

function Piece({ shape: { ink, path }, tone }: { shape: Shape; tone: Tone }) {
  const { fill, stroke, width, dash, opacity } = (tone === 'print' ? PRINT : SCREEN)[ink]
  return (
    <path
      d={path}
      fill={fill}
      fillOpacity={opacity}
      stroke={stroke}
      strokeWidth={width === 0 ? undefined : width}
      strokeDasharray={dash}
      strokeLinejoin="round"
      strokeLinecap="round"
    />
  )
}

function Marks({
  drawing,
  frame,
  marks,
  tone,
}: {
  drawing: Drawing
  frame: DrawnFrame
  marks: readonly Mark[]
  tone: Tone
}) {
  return drawMarks(drawing.view, frame.pose, marks).map(({ key, x, y, disc, ring, far }) => (
    <g key={key} opacity={far ? 0.5 : undefined}>
      {disc > 0 && (
        <circle
          cx={x}
          cy={y}
          r={disc}
          fill={tone === 'print' ? '#000' : 'var(--oxide)'}
          fillOpacity={tone === 'print' ? 0.55 : 0.76}
        />
      )}
      {ring !== null && (
        <circle
          cx={x}
          cy={y}
          r={ring}
          fill="none"
          stroke={tone === 'print' ? '#000' : 'var(--ink)'}
          strokeWidth={1.1}
          strokeDasharray="2.2 1.7"
        />
      )}
    </g>
  ))
}

interface DrawnFigureProps {
  drawing: Drawing
  frame: DrawnFrame
  label: string
  marks?: readonly Mark[]
  tone?: Tone
  className?: string
}

/** One posture of a finished drawing. */
export function DrawnFigure({ drawing, frame, label, marks = [], tone = 'screen', className }: DrawnFigureProps) {
  const id = useId()
  return (
    <svg
      viewBox={drawing.viewBox.join(' ')}
      role="img"
      aria-labelledby={id}
      className={className}
      preserveAspectRatio="xMidYMid meet"
    >
      <title id={id}>{label}</title>
      {frame.shapes.map((shape, index) => (
        <Piece key={index} shape={shape} tone={tone} />
      ))}
      <Marks drawing={drawing} frame={frame} marks={marks} tone={tone} />
    </svg>
  )
}

interface FigureProps {
  /** Name of the exercise, for the sentence that stands for the drawing. */
  name: string
  mechanics: ExerciseMechanics
  frames: readonly SolvedFrame[]
  /** Which posture; the middle one when left out. */
  at?: number
  marks?: readonly Mark[]
  tone?: Tone
  className?: string
}

/** One posture of an exercise, drawn from its own geometry: the thumbnail. */
export function Figure({ name, mechanics, frames, at, marks = [], tone, className }: FigureProps) {
  const drawing = useMemo(() => drawExercise(mechanics, frames), [mechanics, frames])
  const frame = drawing.frames[at ?? Math.floor((drawing.frames.length - 1) / 2)]
  if (frame === undefined) return null
  return (
    <DrawnFigure
      drawing={drawing}
      frame={frame}
      label={describeFigure(name, [frame.name], marks)}
      marks={marks}
      tone={tone}
      className={className}
    />
  )
}
