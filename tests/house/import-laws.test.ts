import { ESLint, type Linter } from 'eslint'
import tseslint from 'typescript-eslint'
import { describe, expect, it } from 'vitest'

// Rules that need types are not asked here, which spares building the whole program.
const eslint = new ESLint({ overrideConfig: [tseslint.configs.disableTypeChecked] as Linter.Config[] })

/** The rules that fire when this text stands in the place of an existing file. */
async function broken(filePath: string, text: string): Promise<string[]> {
  const results = await eslint.lintText(`${text}\n`, { filePath })
  return results.flatMap(({ messages }) => messages.map(({ ruleId, message }) => ruleId ?? message))
}

const PATHS = 'import-x/no-restricted-paths'
const IMPORTS = 'no-restricted-imports'

describe('the import laws', () => {
  it.each([
    ['src/main.tsx', "export * from '../server/errors'", PATHS],
    ['src/main.tsx', "export * from '#server/errors'", PATHS],
    ['src/main.tsx', "export const late = import('../server/errors')", PATHS],
    ['server/errors.ts', "export * from '../src/main'", PATHS],
    ['server/errors.ts', "export * from '#tests/support/clock'", PATHS],
    ['shared/contract/limits.ts', "export * from '#server/errors'", PATHS],
    ['shared/contract/limits.ts', "export * from '../../src/main'", PATHS],
    ['shared/mechanics/sex.ts', "export * from '../rules/muscle-names'", PATHS],
    ['shared/mechanics/sex.ts', "export * from '#shared/rules/muscle-names'", PATHS],
    ['shared/mechanics/sex.ts', "export * from '../contract/limits'", PATHS],
    ['src/features/me/api.ts', "export * from '../auth/api'", PATHS],
    ['src/features/me/api.ts', "export * from '@/features/auth/api'", PATHS],
    ['src/features/me/api.ts', "export * from '@/pages/sign-in'", PATHS],
    ['src/features/me/api.ts', "export * from '@/app/router'", PATHS],
    ['src/components/ui/button.tsx', "export * from '@/features/me/api'", PATHS],
    ['src/lib/api-client.ts', "export * from '@/components/ui/button'", PATHS],
    ['shared/mechanics/sex.ts', "export * from 'node:fs'", IMPORTS],
    ['shared/contract/limits.ts', "export * from 'react'", IMPORTS],
    ['shared/contract/limits.ts', "export * from 'typeorm'", IMPORTS],
  ])('in %s forbid: %s', async (filePath, text, rule) => {
    expect(await broken(filePath, text)).toContain(rule)
  })

  it.each([
    ['src/main.tsx', "export * from '#shared/contract/limits'"],
    ['server/errors.ts', "export * from '#shared/contract/limits'"],
    ['shared/rules/types.ts', "export * from '../mechanics/sex'"],
    ['shared/contract/limits.ts', "export { z } from 'zod'"],
    ['src/features/me/api.ts', "export * from '@/app/paths'"],
    ['src/features/me/api.ts', "export * from '@/lib/api-client'"],
    ['src/pages/me.tsx', "export * from '@/features/me/api'"],
  ])('in %s allow: %s', async (filePath, text) => {
    expect(await broken(filePath, text)).toEqual([])
  })
})

describe('the purity of shared', () => {
  it.each([
    'export const now = Date.now()',
    'export const now = new Date()',
    'export const now = Date()',
    'export const chance = Math.random()',
    'export const home = process.env.HOME',
    "export const page = document.querySelector('p')",
    "export const answer = fetch('/')",
  ])('forbids: %s', async (text) => {
    const rules = await broken('shared/contract/limits.ts', text)
    expect(rules.some((rule) => rule === 'no-restricted-syntax' || rule === 'no-restricted-globals')).toBe(true)
  })

  it('allows a date that was passed in', async () => {
    expect(await broken('shared/contract/limits.ts', 'export const at = (iso: string) => new Date(iso)')).toEqual([])
  })
})

describe('the server', () => {
  it('speaks through its logger only, and scripts to the terminal', async () => {
    expect(await broken('server/errors.ts', "console.log('x')")).toContain('no-console')
    expect(await broken('server/scripts/draft-migration.ts', "console.log('x')")).toEqual([])
  })

  it('reads the environment in one place', async () => {
    expect(await broken('server/errors.ts', 'export const port = process.env.PORT')).toContain(
      'no-restricted-properties',
    )
  })
})
