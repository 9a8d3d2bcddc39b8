import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query'
import { listDemoAccounts, requestPasswordReset, resetPassword, signIn, signOut } from '#shared/contract/auth'
import { call, type Input } from '@/lib/api-client'

/** Whoever was signed in before leaves nothing behind in the cache. */
export function useSignIn() {
  const client = useQueryClient()
  return useMutation({
    mutationFn: (body: Input<typeof signIn>['body']) => call(signIn, { body }),
    meta: { keepsData: true },
    onSuccess: () => client.clear(),
  })
}

export function useSignOut() {
  const client = useQueryClient()
  return useMutation({ mutationFn: () => call(signOut), meta: { keepsData: true }, onSuccess: () => client.clear() })
}

export const useRequestPasswordReset = () =>
  useMutation({
    mutationFn: (body: Input<typeof requestPasswordReset>['body']) => call(requestPasswordReset, { body }),
    meta: { keepsData: true },
  })

export const useResetPassword = () =>
  useMutation({
    mutationFn: (body: Input<typeof resetPassword>['body']) => call(resetPassword, { body }),
    meta: { keepsData: true },
  })

export const demoAccountsQuery = () =>
  queryOptions({
    queryKey: ['demoAccounts'],
    queryFn: ({ signal }) => call(listDemoAccounts, undefined, signal),
    staleTime: Infinity,
  })
