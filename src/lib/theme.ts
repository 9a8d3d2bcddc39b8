import { useSyncExternalStore } from 'react'

export const THEME_CHOICES = ['system', 'light', 'dark'] as const
export type ThemeChoice = (typeof THEME_CHOICES)[number]

/** Shared with public/theme.js, which applies the choice before the first paint. */
const STORAGE_KEY = 'pintle.theme'
const darkPreferred = () => window.matchMedia('(prefers-color-scheme: dark)')
const listeners = new Set<() => void>()

function stored(): ThemeChoice {
  try {
    const value = localStorage.getItem(STORAGE_KEY)
    return value === 'light' || value === 'dark' ? value : 'system'
  } catch {
    return 'system'
  }
}

function apply(): void {
  const choice = stored()
  const dark = choice === 'dark' || (choice === 'system' && darkPreferred().matches)
  document.documentElement.dataset.theme = dark ? 'dark' : 'light'
  for (const listener of listeners) listener()
}

/** Follows the system's preference as it changes, for as long as the person has made no choice of their own. */
export function followSystemTheme(): void {
  darkPreferred().addEventListener('change', apply)
}

export function chooseTheme(choice: ThemeChoice): void {
  if (choice === 'system') localStorage.removeItem(STORAGE_KEY)
  else localStorage.setItem(STORAGE_KEY, choice)
  apply()
}

export function useThemeChoice(): ThemeChoice {
  return useSyncExternalStore((listener) => {
    listeners.add(listener)
    return () => listeners.delete(listener)
  }, stored)
}
