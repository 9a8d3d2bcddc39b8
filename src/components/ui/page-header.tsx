import { useEffect, useRef, type ReactNode } from 'react'
import { useNavigationType } from 'react-router-dom'

interface PageHeaderProps {
  title: string
  /** The line above the title: date, place, what the page belongs to. */
  crumb?: ReactNode
  actions?: ReactNode
}

/** Names the page on screen and in the browser, and takes the focus after a change of page. */
export function PageHeader({ title, crumb, actions }: PageHeaderProps) {
  const heading = useRef<HTMLHeadingElement>(null)
  const navigation = useNavigationType()
  useEffect(() => {
    if (navigation !== 'POP') heading.current?.focus({ preventScroll: true })
  }, [navigation])
  return (
    <header className="mb-4 flex flex-wrap items-end justify-between gap-3">
      <title>{`${title} · Pintle`}</title>
      <div className="min-w-0">
        {crumb !== undefined && <p className="text-pencil">{crumb}</p>}
        <h1 ref={heading} tabIndex={-1} className="text-2xl md:text-3xl">
          {title}
        </h1>
      </div>
      {actions}
    </header>
  )
}
