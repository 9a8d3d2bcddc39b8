import { useQuery } from '@tanstack/react-query'
import type { DemoAccount } from '#shared/contract/auth'
import { ROLE_WORDS } from '@/lib/words'
import { demoAccountsQuery } from '../api'

/** One entry for each person, with all their clubs. */
function byPerson(accounts: readonly DemoAccount[]): DemoAccount[] {
  const people = new Map<string, DemoAccount>()
  for (const account of accounts) {
    const before = people.get(account.email)
    people.set(
      account.email,
      before === undefined ? account : { ...account, clubName: `${before.clubName}, ${account.clubName}` },
    )
  }
  return [...people.values()]
}

/** Invented people anybody may be; nothing stands here outside a demo, and nothing is missed when it cannot be loaded. */
export function DemoAccounts({ onChoose }: { onChoose: (account: DemoAccount) => void }) {
  const { data } = useQuery(demoAccountsQuery())
  if (data === undefined || data.items.length === 0) return null
  return (
    <section aria-labelledby="demo-accounts" className="min-w-0">
      <h2 id="demo-accounts" className="text-xl">
        Demo accounts
      </h2>
      <p className="mb-3 max-w-prose text-pencil">
        The people and clubs are invented. Choose one and the form is filled in.
      </p>
      <ul className="grid gap-2 sm:grid-cols-2">
        {byPerson(data.items).map((account) => (
          <li key={account.email}>
            <button
              type="button"
              onClick={() => onChoose(account)}
              className="w-full rounded-lg border border-edge bg-card px-4 py-2 text-left hover:bg-wash"
            >
              <span className="flex flex-wrap justify-between gap-x-3">
                <span className="font-semibold text-slate">{account.name}</span>
                <span>{ROLE_WORDS[account.role]}</span>
              </span>
              <span className="block text-pencil">{account.clubName}</span>
              <span className="block text-pencil wrap-anywhere">
                {account.email}, password “{account.password}”
              </span>
            </button>
          </li>
        ))}
      </ul>
    </section>
  )
}
