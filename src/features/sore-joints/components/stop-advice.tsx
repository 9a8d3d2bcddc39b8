import type { RedFlag } from '#shared/contract/sore-joint'

/** What cannot wait, by the answer that says so. */
const URGENT: Partial<Record<RedFlag, string>> = {
  chestOrBreath: 'Chest pain or trouble breathing: call the emergency services now. Do not drive yourself.',
  nerve:
    'Lost control of bladder or bowel, numbness between the legs, or weakness that grows: go to an emergency department now.',
  injury: 'A changed shape or a pop: have it looked at today, and keep it still until then.',
  swollenOrFever: 'A hot, swollen joint or a fever: have it looked at today.',
}

/** Stop, and who to see; the most urgent first. */
export function StopAdvice({ flags }: { flags: readonly RedFlag[] }) {
  const urgent = (Object.keys(URGENT) as RedFlag[]).filter((flag) => flags.includes(flag))
  return (
    <div className="rounded-lg border-2 border-oxide bg-oxide-wash px-4 py-3">
      <p className="text-lg font-semibold text-oxide">Stop, and see a licensed clinician.</p>
      {urgent.length > 0 && (
        <ul className="mt-1 grid gap-1">
          {urgent.map((flag) => (
            <li key={flag} className="font-semibold">
              {URGENT[flag]}
            </li>
          ))}
        </ul>
      )}
      <p className="mt-1">
        Do not load this joint until a clinician has seen it. There are no swaps for it until your physio clears it; you
        cannot clear it yourself.
      </p>
    </div>
  )
}
