import '@testing-library/jest-dom/vitest'
import { cleanup } from '@testing-library/react'
import { afterEach, beforeEach, expect, vi } from 'vitest'

/** React reports wrong use with console.error; a test that provokes it on purpose mocks it itself. */
let complaints: unknown[][] = []

beforeEach(() => {
  complaints = []
  vi.spyOn(console, 'error').mockImplementation((...message: unknown[]) => {
    complaints.push(message)
  })
})

afterEach(() => {
  cleanup()
  vi.restoreAllMocks()
  expect(complaints, 'unexpected console.error').toEqual([])
})
