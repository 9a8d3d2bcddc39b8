import { useEffect, useState } from 'react'
import { localDay } from './format'

/** Today’s calendar day, kept right when a page stays open past midnight. */
export function useToday(): string {
  const [today, setToday] = useState(() => localDay())
  useEffect(() => {
    const look = () => setToday(localDay())
    const timer = setInterval(look, 60_000)
    document.addEventListener('visibilitychange', look)
    return () => {
      clearInterval(timer)
      document.removeEventListener('visibilitychange', look)
    }
  }, [])
  return today
}
