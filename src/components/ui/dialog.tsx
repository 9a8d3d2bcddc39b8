import { X } from 'lucide-react'
import * as Radix from 'radix-ui/dialog'
import { useEffect, useRef, type ReactNode } from 'react'
import { Icon } from './icon'

interface DialogProps {
  open: boolean
  /** Asked to close by button, Escape or a press outside; the owner decides. */
  onClose: () => void
  title: string
  description?: ReactNode
  /** Names the step of a dialog with several; a new one starts at its top, and reading starts there too. */
  step?: string
  /** Stays in view below the scrolling part. */
  footer?: ReactNode
  children: ReactNode
}

/** A whole page on phones, a sheet in the middle on wider screens. */
export function Dialog({ open, onClose, title, description, step, footer, children }: DialogProps) {
  const page = useRef<HTMLDivElement>(null)
  const shown = useRef(step)
  useEffect(() => {
    if (shown.current === step) return
    shown.current = step
    if (page.current === null) return
    page.current.scrollTop = 0
    page.current.focus({ preventScroll: true })
  }, [step])
  return (
    <Radix.Root open={open} onOpenChange={(next) => !next && onClose()}>
      <Radix.Portal>
        <Radix.Overlay className="fixed inset-0 z-40 bg-shade print:hidden" />
        <Radix.Content
          {...(description === undefined ? { 'aria-describedby': undefined } : {})}
          className="fixed inset-0 z-50 flex flex-col bg-paper sm:inset-auto sm:top-1/2 sm:left-1/2 sm:max-h-[92dvh] sm:w-[min(42rem,94vw)] sm:-translate-x-1/2 sm:-translate-y-1/2 sm:rounded-xl sm:border sm:border-rule"
        >
          <header className="flex items-start gap-4 border-b border-rule bg-card px-4 py-3 sm:rounded-t-xl sm:px-6">
            <div className="min-w-0 flex-1">
              <Radix.Title className="text-xl">{title}</Radix.Title>
              {description !== undefined && (
                <Radix.Description className="text-pencil">{description}</Radix.Description>
              )}
            </div>
            <Radix.Close className="-mr-2 inline-flex size-11 items-center justify-center rounded-md text-slate hover:bg-wash">
              <Icon of={X} />
              <span className="sr-only">Close</span>
            </Radix.Close>
          </header>
          <div ref={page} tabIndex={-1} className="min-h-0 flex-1 overflow-y-auto px-4 py-5 outline-none sm:px-6">
            {children}
          </div>
          {footer !== undefined && (
            <footer className="flex flex-wrap justify-end gap-3 border-t border-rule bg-card px-4 py-3 sm:rounded-b-xl sm:px-6">
              {footer}
            </footer>
          )}
        </Radix.Content>
      </Radix.Portal>
    </Radix.Root>
  )
}
