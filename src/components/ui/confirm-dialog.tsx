import * as Radix from 'radix-ui/alert-dialog'
import type { ReactNode } from 'react'
import { Button, type ButtonKind } from './button'

interface ConfirmDialogProps {
  open: boolean
  title: string
  children: ReactNode
  /** What happens, as a verb: “Shut out”, “Discard”. */
  confirmLabel: string
  confirmKind?: ButtonKind
  /** What stays as it is: “Keep answering”. */
  cancelLabel: string
  busy?: boolean
  onConfirm: () => void
  onCancel: () => void
}

/** Asks before something that would be missed. The safe answer has the focus. */
export function ConfirmDialog(props: ConfirmDialogProps) {
  return (
    <Radix.Root open={props.open} onOpenChange={(next) => !next && props.onCancel()}>
      <Radix.Portal>
        <Radix.Overlay className="fixed inset-0 z-50 bg-shade print:hidden" />
        <Radix.Content className="fixed top-1/2 left-1/2 z-50 w-[min(30rem,92vw)] -translate-x-1/2 -translate-y-1/2 rounded-xl border border-rule bg-card p-6">
          <Radix.Title className="mb-2 text-xl">{props.title}</Radix.Title>
          <Radix.Description asChild>
            <div className="mb-5 max-w-prose">{props.children}</div>
          </Radix.Description>
          <div className="flex flex-wrap justify-end gap-3">
            <Radix.Cancel asChild>
              <Button>{props.cancelLabel}</Button>
            </Radix.Cancel>
            <Button
              kind={props.confirmKind ?? 'danger'}
              busy={props.busy}
              busyLabel="One moment"
              onClick={props.onConfirm}
            >
              {props.confirmLabel}
            </Button>
          </div>
        </Radix.Content>
      </Radix.Portal>
    </Radix.Root>
  )
}
