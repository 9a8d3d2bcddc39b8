import { readdirSync, readFileSync } from 'node:fs'
import { describe, expect, it } from 'vitest'
import { firstLoadKeys, firstLoadScripts, type Manifest } from '#tests/support/first-load'

const CLIENT = 'dist/client'
const LIMIT = 180_000

describe('the built client', () => {
  const manifest = JSON.parse(readFileSync(`${CLIENT}/.vite/manifest.json`, 'utf8')) as Manifest

  it(`loads at most ${LIMIT / 1000} kB of gzipped JavaScript before the first page`, () => {
    const scripts = firstLoadScripts(CLIENT, manifest)
    expect(scripts.length).toBeGreaterThan(0)
    const total = scripts.reduce((sum, { bytes }) => sum + bytes, 0)
    expect(total, JSON.stringify(scripts)).toBeLessThanOrEqual(LIMIT)
  })

  it('loads each page when it is opened and not before', () => {
    // What the router opens exports a Component; other files there are parts of a page.
    const pages = readdirSync('src/pages')
      .map((file) => `src/pages/${file}`)
      .filter((file) => /^export (async )?(function|const) Component\b/m.test(readFileSync(file, 'utf8')))
    expect(pages.length).toBeGreaterThan(0)
    const first = firstLoadKeys(manifest)
    const eager = pages.filter((page) => manifest[page]?.isDynamicEntry !== true || first.includes(page))
    expect(eager).toEqual([])
  })

  it('has no inline script, which the content security policy would block', () => {
    const html = readFileSync(`${CLIENT}/index.html`, 'utf8')
    expect(html).not.toMatch(/<script(?![^>]*\ssrc=)/)
    expect(html).not.toMatch(/\son[a-z]+=/)
  })
})
