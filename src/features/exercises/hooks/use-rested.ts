import { useEffect, useState } from 'react'

/** The value once it has not changed for a while. */
export function useRested<T>(value: T, rest: number): T {
  const [rested, setRested] = useState(value)
  useEffect(() => {
    const timer = setTimeout(() => setRested(value), rest)
    return () => clearTimeout(timer)
  }, [value, rest])
  return rested
}
