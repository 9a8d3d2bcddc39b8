/** The pin in its hinge. */
export function Mark() {
  return (
    <svg aria-hidden viewBox="0 0 24 24" width="24" height="24" fill="none" strokeWidth="2" strokeLinecap="round">
      <path d="M3 6.5h18M3 17.5h18" className="stroke-ink" />
      <path d="M12 2v4.5M12 17.5V22" className="stroke-oxide" />
      <circle cx="12" cy="12" r="4.75" className="fill-card stroke-oxide" />
    </svg>
  )
}
