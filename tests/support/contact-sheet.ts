import { readdirSync, readFileSync } from 'node:fs'
import { join } from 'node:path'
import { chromium } from 'playwright-core'
import { createElement } from 'react'
import { renderToStaticMarkup } from 'react-dom/server'
import { parse } from 'yaml'
import { exerciseDocument, type ExerciseDocument } from '#shared/contract/exercise'
import { solveExercise } from '#shared/mechanics/index'
import { drawExercise } from '@/components/figure/draw'
import { DrawnFigure } from '@/components/figure/figure'

/**
 * Every posture of every catalogue exercise on one sheet, to be looked at: limbs that bend the wrong way, hands off the
 * bar and feet through the floor show here. `npx tsx tests/support/contact-sheet.ts out.png [part of a slug]`
 */
const CATALOGUE = join(import.meta.dirname, '../../seeds/catalogue')
const CHROMIUM_FLAGS = [
  '--headless',
  '--no-sandbox',
  '--disable-gpu',
  '--disable-quic',
  '--no-first-run',
  '--disable-background-networking',
  '--disable-component-update',
  '--disable-sync',
]

export function readCatalogue(filter: string): ExerciseDocument[] {
  return readdirSync(CATALOGUE)
    .filter((file) => file.endsWith('.yaml'))
    .sort()
    .flatMap((file) => {
      const content: unknown = parse(readFileSync(join(CATALOGUE, file), 'utf8'))
      return Array.isArray(content) ? content : [content]
    })
    .map((content) => exerciseDocument.parse(content))
    .filter(({ slug }) => slug.includes(filter))
}

function rowOf({ slug, name, mechanics }: Pick<ExerciseDocument, 'slug' | 'name' | 'mechanics'>): string {
  const head = `<h2>${slug}</h2>`
  try {
    const solution = solveExercise(mechanics, 'unspecified')
    const drawing = drawExercise(mechanics, solution.frames)
    const figures = drawing.frames.map(
      (frame) =>
        `<figure>${renderToStaticMarkup(createElement(DrawnFigure, { drawing, frame, label: name }))}<figcaption>${frame.name}</figcaption></figure>`,
    )
    return `<section>${head}<div>${figures.join('')}</div></section>`
  } catch (error) {
    return `<section>${head}<p>${error instanceof Error ? error.message : String(error)}</p></section>`
  }
}

export async function contactSheet(
  exercises: ReadonlyArray<Pick<ExerciseDocument, 'slug' | 'name' | 'mechanics'>>,
  out: string,
): Promise<void> {
  const html = `<!doctype html><style>
    :root{--paper:#faf7f2;--card:#fff;--ink:#1e2226;--pencil:#5b6168;--rule:#ddd6ca;--oxide:#9c3b1b;--lichen:#3f6b5c;--slate:#33506b;--wash:#f1ebe1;--body:#e4dccf;--body-line:#8b8378}
    body{margin:12px;font:13px sans-serif;background:var(--card);display:grid;grid-template-columns:repeat(3,1fr);gap:10px}
    section{border:1px solid var(--rule);padding:4px}h2{font-size:13px;margin:0}div{display:flex}figure{flex:1;margin:0;text-align:center}svg{width:100%;height:230px}p{color:var(--oxide)}
  </style>${exercises.map(rowOf).join('')}`
  const browser = await chromium.launch({ executablePath: '/usr/bin/chromium', args: CHROMIUM_FLAGS })
  try {
    const page = await browser.newPage({ viewport: { width: 1680, height: 900 } })
    await page.setContent(html)
    await page.screenshot({ path: out, fullPage: true })
  } finally {
    await browser.close()
  }
}

if (process.argv[1] === import.meta.filename) {
  const [out = 'contact-sheet.png', filter = ''] = process.argv.slice(2)
  const exercises = readCatalogue(filter)
  await contactSheet(exercises, out)
  console.log(`${exercises.length} exercises drawn to ${out}`)
}
