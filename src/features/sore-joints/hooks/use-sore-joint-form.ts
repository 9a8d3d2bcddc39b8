import { zodResolver } from '@hookform/resolvers/zod'
import { useForm, type Resolver } from 'react-hook-form'
import { RED_FLAGS, soreJointReport, type RedFlag, type SoreJointReport } from '#shared/contract/sore-joint'

/** The report while it is being filled in: nothing is answered beforehand. */
export type SoreJointForm = Partial<Omit<SoreJointReport, 'redFlags' | 'provocations' | 'day'>> &
  Pick<SoreJointReport, 'provocations' | 'day'> & { redFlags: Partial<Record<RedFlag, boolean>> }

/** The question is answered yes, or the rating says the same. */
export const SEVERE_FROM = 8

export function useSoreJointForm(day: string) {
  const form = useForm<SoreJointForm, unknown, SoreJointReport>({
    // The form’s values are the report with holes; the schema is what finds them.
    resolver: zodResolver(soreJointReport) as unknown as Resolver<SoreJointForm, unknown, SoreJointReport>,
    defaultValues: { redFlags: {}, provocations: [], note: '', day },
  })
  const [redFlags, rating] = form.watch(['redFlags', 'rating'])
  const raised = RED_FLAGS.filter(
    (flag) => redFlags[flag] === true || (flag === 'severePain' && rating !== undefined && rating >= SEVERE_FROM),
  )
  return { form, raised }
}
