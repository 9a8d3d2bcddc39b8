/** Prints one hash over everything a build is made from. */
import { createHash } from 'node:crypto'
import { existsSync, readdirSync, readFileSync, statSync } from 'node:fs'
import { join } from 'node:path'

const SOURCES = [
  'src',
  'shared',
  'server',
  'seeds',
  'public',
  'index.html',
  'package-lock.json',
  'tailwind.config.ts',
  'tsconfig.json',
  'vite.config.ts',
  'vite.server.config.ts',
]

const files = (path) =>
  statSync(path).isDirectory()
    ? readdirSync(path)
        .toSorted()
        .flatMap((name) => files(join(path, name)))
    : [path]

const hash = createHash('sha256')
for (const source of SOURCES.filter((path) => existsSync(path)).flatMap(files)) {
  const content = readFileSync(source)
  hash.update(`${source}\0${content.length}\0`).update(content)
}
console.log(hash.digest('hex'))
