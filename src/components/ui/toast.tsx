import { X } from 'lucide-react'
import * as Radix from 'radix-ui/toast'
import { createContext, useCallback, useContext, useState, type ReactNode } from 'react'
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

/** Shows a short message that goes by itself; with an action it stays longer. */
export function useToast(): (message: ToastMessage) => void {
  const show = useContext(ToastContext)
  if (show === null) throw new Error('useToast needs a ToastProvider around it.')
  return show
}

export function ToastProvider({ children }: { children: ReactNode }) {
  const [shown, setShown] = useState<Shown[]>([])
  const show = useCallback(
    (message: ToastMessage) =>
      setShown((before) => [...before.slice(-2), { ...message, key: (before.at(-1)?.key ?? 0) + 1 }]),
    [],
  )
  const remove = (key: number) => setShown((before) => before.filter((toast) => toast.key !== key))
  return (
    <ToastContext value={show}>
      <Radix.Provider label="Message" swipeDirection="down">
        {children}
        {shown.map((toast) => (
          <Radix.Root
            key={toast.key}
            type={toast.action === undefined ? 'background' : 'foreground'}
            duration={toast.action === undefined ? 6_000 : 12_000}
            onOpenChange={(open) => !open && remove(toast.key)}
            className="flex items-center gap-3 rounded-lg border border-edge bg-card py-1 pr-1 pl-4 shadow-lg"
          >
            <Radix.Description className="flex-1 py-2">{toast.text}</Radix.Description>
            {toast.action !== undefined && (
              <Radix.Action asChild altText={toast.action.label}>
                <button type="button" onClick={toast.action.run} className="min-h-target px-3 font-semibold link">
                  {toast.action.label}
                </button>
              </Radix.Action>
            )}
            <Radix.Close className="inline-flex size-11 shrink-0 items-center justify-center rounded-md text-slate hover:bg-wash">
              <Icon of={X} />
              <span className="sr-only">Close this message</span>
            </Radix.Close>
          </Radix.Root>
        ))}
        <Radix.Viewport
          label="Messages ({hotkey})"
          className="fixed inset-x-4 bottom-20 z-60 mx-auto flex max-w-md flex-col gap-2 outline-none md:bottom-6"
        />
      </Radix.Provider>
    </ToastContext>
  )
}
