import { X } from 'lucide-react'
import * as Radix from 'radix-ui/toast'
import { createContext, useCallback, useContext, useRef, useState, type ReactNode } from 'react'
import { Icon } from './icon'

export interface ToastMessage {
  text: string
  /** One way back, usually “Undo”. */
  action?: { label: string; run: () => void }
}
interface Shown extends ToastMessage {
  key: number
}
const ToastContext = createContext<((message: ToastMessage) => void) | null>(null)

/** Shows a short message that goes by itself, in the place of the one before; with an action it stays longer. */
export function useToast(): (message: ToastMessage) => void {
  const show = useContext(ToastContext)
  if (show === null) throw new Error('useToast needs a ToastProvider around it.')
  return show
}

export function ToastProvider({ children }: { children: ReactNode }) {
  const [shown, setShown] = useState<Shown | null>(null)
  /** Never used twice, so that an older message that closes late does not take a newer one with it. */
  const lastKey = useRef(0)
  const show = useCallback((message: ToastMessage) => {
    lastKey.current += 1
    setShown({ ...message, key: lastKey.current })
  }, [])
  const remove = (key: number) => setShown((now) => (now?.key === key ? null : now))
  return (
    <ToastContext value={show}>
      <Radix.Provider label="Message" swipeDirection="down">
        {children}
        {shown !== null && (
          <Radix.Root
            key={shown.key}
            type={shown.action === undefined ? 'background' : 'foreground'}
            duration={shown.action === undefined ? 6_000 : 12_000}
            onOpenChange={(open) => !open && remove(shown.key)}
            className="flex items-center gap-3 rounded-lg border border-edge bg-card py-1 pr-1 pl-4 shadow-lg"
          >
            <Radix.Description className="flex-1 py-2">{shown.text}</Radix.Description>
            {shown.action !== undefined && (
              <Radix.Action asChild altText={shown.action.label}>
                <button type="button" onClick={shown.action.run} className="min-h-target px-3 font-semibold link">
                  {shown.action.label}
                </button>
              </Radix.Action>
            )}
            <Radix.Close className="inline-flex size-11 shrink-0 items-center justify-center rounded-md text-slate hover:bg-wash">
              <Icon of={X} />
              <span className="sr-only">Close this message</span>
            </Radix.Close>
          </Radix.Root>
        )}
        <Radix.Viewport
          label="Messages ({hotkey})"
          className="fixed inset-x-4 bottom-20 z-60 mx-auto flex max-w-md flex-col gap-2 outline-none md:bottom-6"
        />
      </Radix.Provider>
    </ToastContext>
  )
}
