import type { TestProject } from 'vitest/node'
import { startBuiltServer } from './built-server'
import { administer, databaseUrl } from './database'
import { testClusterUrl } from './test-cluster'

declare module 'vitest' {
  export interface ProvidedContext {
    /** Address of the built server with the demo, for journeys in a browser. */
    baseUrl: string
    mailPageUrl: string
  }
}

/** One built server with a fresh demo database for all journeys. */
export default async function setup(project: TestProject) {
  const adminUrl = testClusterUrl()
  const name = `pintle_e2e_${process.pid}_${Date.now().toString(36)}`
  await administer(adminUrl, `create database "${name}"`)
  const drop = () => administer(adminUrl, `drop database if exists "${name}" with (force)`)
  try {
    const server = await startBuiltServer(databaseUrl(adminUrl, name))
    project.provide('adminUrl', adminUrl)
    project.provide('baseUrl', server.url)
    project.provide('mailPageUrl', server.mailPageUrl)
    return async () => {
      await server.stop()
      await drop()
    }
  } catch (error) {
    await drop()
    throw error
  }
}
