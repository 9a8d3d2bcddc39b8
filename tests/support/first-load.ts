import { readFileSync } from 'node:fs'
import { join } from 'node:path'
import { gzipSync } from 'node:zlib'

/** One chunk in vite's manifest. */
export interface ManifestChunk {
  file: string
  isEntry?: boolean
  isDynamicEntry?: boolean
  imports?: string[]
}
export type Manifest = Record<string, ManifestChunk>

/** Keys of everything that a browser fetches before the first page's own chunk: the entries and what they import. */
export function firstLoadKeys(manifest: Manifest): string[] {
  const waiting = Object.keys(manifest).filter((key) => manifest[key]?.isEntry === true)
  const seen = new Set<string>()
  for (let key = waiting.pop(); key !== undefined; key = waiting.pop()) {
    if (seen.has(key)) continue
    seen.add(key)
    waiting.push(...(manifest[key]?.imports ?? []))
  }
  return [...seen]
}

const gzipSize = (path: string) => gzipSync(readFileSync(path), { level: 9 }).length

/** JavaScript of the first load, largest first: file and gzipped bytes. Scripts that index.html names count as well. */
export function firstLoadScripts(directory: string, manifest: Manifest): Array<{ file: string; bytes: number }> {
  const html = readFileSync(join(directory, 'index.html'), 'utf8')
  const named = [...html.matchAll(/<script[^>]+src="\/([^"]+)"/g)].map(([, file]) => file ?? '')
  const chunks = firstLoadKeys(manifest).map((key) => manifest[key]?.file ?? '')
  return [...new Set([...named, ...chunks])]
    .filter((file) => file.endsWith('.js'))
    .map((file) => ({ file, bytes: gzipSize(join(directory, file)) }))
    .toSorted((a, b) => b.bytes - a.bytes)
}
