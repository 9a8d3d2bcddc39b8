import type { TestProject } from 'vitest/node'
import { createDataSource } from '#server/database/data-source'
import { administer, databaseUrl } from './database'
import { testClusterUrl } from './test-cluster'

declare module 'vitest' {
  export interface ProvidedContext {
    adminUrl: string
    templateDatabase: string
  }
}

/** Migrates one template database; each test file clones it. */
export default async function setup(project: TestProject) {
  const adminUrl = testClusterUrl()
  const template = `pintle_test_${process.pid}_${Date.now().toString(36)}`
  await administer(adminUrl, `create database "${template}"`)
  const dataSource = await createDataSource({ url: databaseUrl(adminUrl, template) }).initialize()
  await dataSource.runMigrations()
  await dataSource.destroy()
  project.provide('adminUrl', adminUrl)
  project.provide('templateDatabase', template)
  return async () => administer(adminUrl, `drop database if exists "${template}" with (force)`)
}
