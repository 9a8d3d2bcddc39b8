/** Why a swap was not taken, announced when it appears. */
export function TakeNotice({ text }: { text: string | null }) {
  return (
    <div role="alert">
      {text !== null && (
        <p className="mb-4 max-w-[88ch] rounded-lg border border-brass bg-brass-wash px-4 py-3 font-semibold">{text}</p>
      )}
    </div>
  )
}
