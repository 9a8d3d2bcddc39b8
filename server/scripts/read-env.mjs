/** Prints `export NAME='value'` for every variable of an env file that the environment does not set already. */
import { readFileSync } from 'node:fs'
import { parseEnv } from 'node:util'

for (const [name, value] of Object.entries(parseEnv(readFileSync(process.argv[2], 'utf8')))) {
  if (process.env[name] !== undefined || !/^[A-Za-z_][A-Za-z0-9_]*$/.test(name)) continue
  console.log(`export ${name}='${value.replaceAll("'", "'\\''")}'`)
}
