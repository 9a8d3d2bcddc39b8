import * as Radix from 'radix-ui/switch'

interface SwitchProps {
  label: string
  /** What each position means, shown beside the switch. */
  words: { on: string; off: string }
  on: boolean
  busy?: boolean
  onChange: (on: boolean) => void
}

/** On or off, at once. The words beside it say which, so that colour does not have to. */
export function Switch({ label, words, on, busy = false, onChange }: SwitchProps) {
  return (
    <Radix.Root
      checked={on}
      disabled={busy}
      onCheckedChange={onChange}
      aria-label={label}
      className="group inline-flex min-h-target shrink-0 cursor-pointer items-center gap-2 rounded-md px-1 disabled:cursor-progress"
    >
      <span aria-hidden className={on ? 'font-semibold' : 'text-pencil'}>
        {on ? words.on : words.off}
      </span>
      <span
        aria-hidden
        className="flex h-7 w-12 items-center rounded-full border-2 border-edge bg-wash px-0.5 group-data-[state=checked]:border-slate group-data-[state=checked]:bg-slate"
      >
        <Radix.Thumb className="size-5 rounded-full bg-edge transition-transform data-[state=checked]:translate-x-5 data-[state=checked]:bg-card" />
      </span>
    </Radix.Root>
  )
}
