/** Exits 0 when node_modules holds what package-lock.json says; optional packages of other platforms may be missing. */
import { readFileSync } from 'node:fs'

const packages = (file) => JSON.parse(readFileSync(file, 'utf8')).packages

try {
  const wanted = packages('package-lock.json')
  const installed = packages('node_modules/.package-lock.json')
  const current = Object.entries(wanted).every(
    ([path, { version, optional, peer }]) =>
      path === '' ||
      (installed[path] === undefined ? optional === true || peer === true : installed[path].version === version),
  )
  process.exit(current ? 0 : 1)
} catch {
  process.exit(1)
}
