/** Runs every check of `npm test` in order and ends with the true totals on a line of their own. */
import { spawn } from 'node:child_process'
import { mkdirSync, readFileSync, rmSync } from 'node:fs'

const REPORTS = '.data/test-reports'

interface Totals {
  passed: number
  failed: number
}
interface VitestReport {
  numPassedTests: number
  numFailedTests: number
  numPendingTests: number
  numTodoTests: number
  testResults: Array<{ name: string; status: string; message: string; assertionResults: unknown[] }>
}

const totals: Totals = { passed: 0, failed: 0 }
const failures: string[] = []
let testsRun = 0

const run = (command: string, args: string[], env: Record<string, string> = {}): Promise<number> =>
  new Promise((resolve) => {
    const child = spawn(command, args, {
      stdio: ['ignore', 'inherit', 'inherit'],
      env: { ...process.env, NO_COLOR: '1', ...env },
    })
    child.once('error', () => resolve(1))
    child.once('exit', (code) => resolve(code ?? 1))
  })

const add = (name: string, { passed, failed }: Totals) => {
  totals.passed += passed
  totals.failed += failed
  if (failed > 0) failures.push(`${name}: ${failed} failed`)
}

/** A command that passes or fails as a whole counts as one check. */
async function check(name: string, command: string, args: string[], env?: Record<string, string>): Promise<boolean> {
  const start = Date.now()
  console.log(`\n# ${name}`)
  const passed = (await run(command, args, env)) === 0
  console.log(`# ${name}: ${passed ? 'passed' : 'FAILED'} in ${Math.round((Date.now() - start) / 1000)} s`)
  add(name, passed ? { passed: 1, failed: 0 } : { passed: 0, failed: 1 })
  return passed
}

/** Counts every test of these vitest projects. A file that could not be loaded, and a skipped test, count as failed. */
async function tests(name: string, projects: string[]): Promise<void> {
  const file = `${REPORTS}/${projects.join('-')}.json`
  const start = Date.now()
  console.log(`\n# ${name}`)
  rmSync(file, { force: true })
  const code = await run('npx', [
    '--no-install',
    'vitest',
    'run',
    ...projects.flatMap((project) => ['--project', project]),
    '--passWithNoTests',
    '--reporter=dot',
    '--reporter=json',
    `--outputFile.json=${file}`,
  ])
  console.log(`# ${name}: ${Math.round((Date.now() - start) / 1000)} s`)
  let report: VitestReport
  try {
    report = JSON.parse(readFileSync(file, 'utf8')) as VitestReport
  } catch {
    console.log(`# ${name} wrote no report`)
    add(name, { passed: 0, failed: 1 })
    return
  }
  const unloadable = report.testResults.filter(
    (result) => result.status === 'failed' && result.assertionResults.length === 0,
  )
  const skipped = report.numPendingTests + report.numTodoTests
  if (skipped > 0) console.log(`# ${name}: ${skipped} skipped, which counts as failed`)
  testsRun += report.numPassedTests + report.numFailedTests
  const failed = report.numFailedTests + unloadable.length + skipped
  // Vitest also fails for errors outside any test, which no count shows.
  add(name, { passed: report.numPassedTests, failed: failed === 0 && code !== 0 ? 1 : failed })
}

mkdirSync(REPORTS, { recursive: true })
await check('types', 'npx', ['--no-install', 'tsc', '-p', '.', '--noEmit'])
await check('types of shared without DOM and Node', 'npx', ['--no-install', 'tsc', '-p', 'shared', '--noEmit'])
await check('lint', 'npx', ['--no-install', 'eslint', '.', '--max-warnings', '0'])
await check('format', 'npx', ['--no-install', 'prettier', '--check', '--log-level', 'warn', '.'])
await tests('unit, API and reference tests', ['shared', 'server', 'src', 'reference', 'house'])
const built =
  (await check('build of the client', 'npx', ['--no-install', 'vite', 'build', '--logLevel', 'warn'], {
    NODE_ENV: 'production',
  })) &&
  (await check(
    'build of the server',
    'npx',
    ['--no-install', 'vite', 'build', '-c', 'vite.server.config.ts', '--logLevel', 'warn'],
    {
      NODE_ENV: 'production',
    },
  ))
if (built) await tests('tests of the build and journeys in a browser', ['build', 'e2e'])

if (testsRun === 0) {
  failures.push('no test ran')
  totals.failed += 1
}
console.log(failures.length === 0 ? '' : `\nFailed:\n${failures.map((line) => `  ${line}`).join('\n')}\n`)
console.log(`${totals.passed} passed, ${totals.failed} failed`)
process.exit(totals.failed === 0 ? 0 : 1)
