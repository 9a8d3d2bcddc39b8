import { useQuery } from '@tanstack/react-query'
import { useState } from 'react'
import type { z } from 'zod'
import type { careTeamMember } from '#shared/contract/athlete'
import { ConfirmDialog } from '@/components/ui/confirm-dialog'
import { Loaded, Skeleton } from '@/components/ui/states'
import { Switch } from '@/components/ui/switch'
import { useToast } from '@/components/ui/toast'
import { messageOf } from '@/lib/api-error'
import { formatInstant } from '@/lib/format'
import { ROLE_WORDS } from '@/lib/words'
import { careTeamQuery, useSetConsent } from '../api'

type Member = z.infer<typeof careTeamMember>

/** Who may see the athlete’s sessions and joints. Nobody is let in unless the athlete says so, and each can be shut out at once. */
export function CareTeam() {
  const query = useQuery(careTeamQuery())
  const consent = useSetConsent()
  const toast = useToast()
  const [leaving, setLeaving] = useState<Member | null>(null)
  const set = (member: Member, letIn: boolean) =>
    consent.mutate(
      { userId: member.userId, letIn },
      {
        onSuccess: () => toast({ text: letIn ? `${member.name} is let in.` : `${member.name} is shut out.` }),
        onError: (error) => toast({ text: messageOf(error, 'That could not be saved. Try again.') }),
      },
    )
  return (
    <>
      <p className="mb-3 text-pencil">
        Who is let in sees your sessions, your sore joints and what you write about them. Everything they read is in the
        trail.
      </p>
      <Loaded query={query} what="care team" skeleton={<Skeleton className="h-32" />}>
        {({ items }) =>
          items.length === 0 ? (
            <p>Your clubs have no coach or physio yet.</p>
          ) : (
            <ul className="divide-y divide-rule">
              {items.map((member) => (
                <li key={member.userId} className="flex flex-wrap items-center justify-between gap-x-4 py-2">
                  <div className="min-w-0">
                    <p className="font-semibold">{member.name}</p>
                    <p className="text-pencil">
                      {ROLE_WORDS[member.role]}, {member.clubName}
                      {member.consentSince !== null && `, since ${formatInstant(member.consentSince)}`}
                    </p>
                  </div>
                  <Switch
                    label={`Let ${member.name} in`}
                    words={{ on: 'let in', off: 'not let in' }}
                    on={member.consentSince !== null}
                    onChange={(on) => (on ? set(member, true) : setLeaving(member))}
                  />
                </li>
              ))}
            </ul>
          )
        }
      </Loaded>
      <ConfirmDialog
        open={leaving !== null}
        title={`Shut ${leaving?.name ?? ''} out?`}
        confirmLabel="Shut out"
        cancelLabel="Keep letting in"
        onCancel={() => setLeaving(null)}
        onConfirm={() => {
          if (leaving !== null) set(leaving, false)
          setLeaving(null)
        }}
      >
        From this moment they see nothing of yours. You can let them in again at any time.
      </ConfirmDialog>
    </>
  )
}
