import { useSyncExternalStore } from 'react'

const QUERY = '(min-width: 66rem)'
const media = (): MediaQueryList | null => (typeof window.matchMedia === 'function' ? window.matchMedia(QUERY) : null)

/** Whether a wide table fits beside the rail; below that its rows become cards. */
export function useWide(): boolean {
  return useSyncExternalStore(
    (listener) => {
      const list = media()
      list?.addEventListener('change', listener)
      return () => list?.removeEventListener('change', listener)
    },
    () => media()?.matches ?? true,
  )
}
