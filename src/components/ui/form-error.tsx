import { ApiError } from '@/lib/api-error'

/** Why a form was not saved, above its button; what was typed stays. */
export function FormError({ error }: { error: unknown }) {
  return (
    <div role="alert" className="empty:hidden">
      {error !== null && error !== undefined && (
        <p className="rounded-md border border-oxide bg-oxide-wash px-4 py-2">
          {error instanceof ApiError ? error.message : 'Something went wrong. Try again.'}{' '}
          {error instanceof ApiError && <span className="text-pencil">({error.code})</span>}
        </p>
      )}
    </div>
  )
}
