import { pino } from 'pino'
import { describe, expect, it } from 'vitest'
import { Background } from '#server/background'

describe('background work', () => {
  it('is waited for by settled, also when it starts more', async () => {
    const done: string[] = []
    const background = new Background(pino({ level: 'silent' }))
    background.run('first', async () => {
      await new Promise((resolve) => setTimeout(resolve, 5))
      done.push('first')
      background.run('second', async () => {
        await new Promise((resolve) => setTimeout(resolve, 5))
        done.push('second')
      })
    })
    await background.settled()
    expect(done).toEqual(['first', 'second'])
  })

  it('that fails is logged under its name and hurts nobody else', async () => {
    const lines: string[] = []
    const background = new Background(pino({}, { write: (line: string) => lines.push(line) }))
    background.run('broken', () => {
      throw new Error('no')
    })
    await background.settled()
    expect(lines.map((line) => (JSON.parse(line) as { task: string }).task)).toEqual(['broken'])
  })
})
