import type { ReactNode } from 'react'
import { Link, ScrollRestoration, useNavigation } from 'react-router-dom'
import { CautionLine } from '@/components/ui/caution'
import { Mark } from './mark'
import { paths } from './paths'

interface FrameProps {
  /** Right of the name in the top bar. */
  top?: ReactNode
  rail?: ReactNode
  bar?: ReactNode
  children: ReactNode
}

/** What every page stands in: skip link, top bar, rail or bottom bar, the page, and the caution at its foot. */
export function Frame({ top, rail, bar, children }: FrameProps) {
  const going = useNavigation().state !== 'idle'
  return (
    <div className="flex min-h-dvh flex-col">
      <a
        href="#page"
        className="sr-only z-70 rounded-md bg-card px-4 py-3 link focus:not-sr-only focus:fixed focus:top-2 focus:left-2"
      >
        Skip to the page
      </a>
      <header className="border-b border-rule bg-card print:hidden">
        <div className="flex min-h-13 flex-wrap items-center gap-x-6 px-4 md:px-6">
          <Link to={paths.home()} className="flex min-h-target items-center gap-2 text-lg font-bold">
            <Mark />
            Pintle
          </Link>
          {top}
        </div>
        <div
          role="progressbar"
          aria-label="Opening the page"
          hidden={!going}
          className="h-0.5 animate-pulse bg-slate"
        />
      </header>
      <div className="mx-auto flex w-full max-w-page flex-1">
        {rail}
        <main id="page" tabIndex={-1} className="min-w-0 flex-1 px-4 pt-4 pb-8 outline-none md:px-8 md:pt-6">
          {children}
        </main>
      </div>
      <footer className="border-t border-rule px-4 py-3 text-center text-pencil max-md:pb-20 print:pb-3">
        <CautionLine />
      </footer>
      {bar}
      <ScrollRestoration />
    </div>
  )
}
