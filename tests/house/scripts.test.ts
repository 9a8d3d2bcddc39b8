import { execFileSync } from 'node:child_process'
import { createServer } from 'node:net'
import { mkdirSync, mkdtempSync, writeFileSync } from 'node:fs'
import type { AddressInfo } from 'node:net'
import { tmpdir } from 'node:os'
import { join, resolve } from 'node:path'
import { describe, expect, it } from 'vitest'

const script = (name: string) => resolve('server/scripts', name)
const folder = () => mkdtempSync(join(tmpdir(), 'pintle-scripts-'))

describe('read-env', () => {
  it('hands values to the shell as they are, whatever they contain', () => {
    const cwd = folder()
    const value = `it's $(touch owned) \`touch owned\` "x" <no-reply@example.test>; touch owned`
    writeFileSync(join(cwd, '.env'), `MAIL_FROM=\`${value.replaceAll('`', '')}\`\n# comment\nPORT=4999\n`)
    const shown = execFileSync(
      'sh',
      ['-c', `eval "$(node ${script('read-env.mjs')} .env)"; printf '%s|%s|' "$MAIL_FROM" "$PORT"; ls`],
      { cwd, encoding: 'utf8', env: { PATH: process.env.PATH } },
    )
    expect(shown).toBe(`${value.replaceAll('`', '')}|4999|`)
  })

  it('leaves alone what the environment says already', () => {
    const cwd = folder()
    writeFileSync(join(cwd, '.env'), 'PORT=4999\n')
    const env = { PATH: process.env.PATH, PORT: '5000' }
    expect(execFileSync('node', [script('read-env.mjs'), '.env'], { cwd, encoding: 'utf8', env })).toBe('')
  })
})

describe('dependencies-current', () => {
  const isCurrent = (wanted: object, installed: object | null) => {
    const cwd = folder()
    writeFileSync(join(cwd, 'package-lock.json'), JSON.stringify({ packages: { '': {}, ...wanted } }))
    mkdirSync(join(cwd, 'node_modules'))
    if (installed !== null) {
      writeFileSync(join(cwd, 'node_modules/.package-lock.json'), JSON.stringify({ packages: installed }))
    }
    try {
      execFileSync('node', [script('dependencies-current.mjs')], { cwd })
      return true
    } catch {
      return false
    }
  }
  const one = { 'node_modules/a': { version: '1.0.0' } }

  it('is true only when every wanted package is there in its version', () => {
    expect(isCurrent(one, one)).toBe(true)
    expect(isCurrent(one, { 'node_modules/a': { version: '1.0.1' } })).toBe(false)
    expect(isCurrent(one, {})).toBe(false)
    expect(isCurrent(one, null)).toBe(false)
  })

  it('does not miss optional packages of other platforms', () => {
    expect(isCurrent({ ...one, 'node_modules/b': { version: '1.0.0', optional: true } }, one)).toBe(true)
  })
})

describe('free-port', () => {
  it('goes on to the next when a port is taken', async () => {
    const server = createServer()
    await new Promise<void>((done) => server.listen(0, '127.0.0.1', done))
    const { port } = server.address() as AddressInfo
    const found = Number(execFileSync('node', [script('free-port.mjs'), String(port)], { encoding: 'utf8' }))
    server.close()
    expect(found).toBeGreaterThan(port)
  })
})

describe('the shell scripts', () => {
  it.each(['start', 'dev', 'test', 'bench', 'postgres', 'lib'])('%s.sh parses in a plain shell', (name) => {
    expect(() => execFileSync('sh', ['-n', script(`${name}.sh`)])).not.toThrow()
  })
})
