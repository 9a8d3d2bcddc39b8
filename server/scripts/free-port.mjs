/** Prints the first free loopback port from the given one up; 0 means any. */
import { createServer } from 'node:net'

const isFree = (port) =>
  new Promise((resolve) => {
    const server = createServer()
    server.once('error', () => resolve(null))
    server.listen(port, '127.0.0.1', () => {
      const { port: bound } = server.address()
      server.close(() => resolve(bound))
    })
  })

const first = Number(process.argv[2] ?? 0)
for (let port = first; port < first + 200; port += 1) {
  const bound = await isFree(port)
  if (bound !== null) {
    console.log(bound)
    process.exit(0)
  }
}
console.error(`No free port from ${first} to ${first + 199}.`)
process.exit(1)
