/** One line for the footer of every page. */
export function CautionLine() {
  return (
    <p>Training information, not medical advice. Your physio’s and physician’s word goes before anything shown here.</p>
  )
}

/** In full, where swaps are shown. It has no way to be dismissed. */
export function Caution() {
  return (
    <aside aria-label="Caution" className="max-w-[88ch] rounded-lg border border-brass bg-brass-wash px-4 py-3">
      <p>
        <strong className="text-brass">Training information, not a diagnosis and not medical advice.</strong> Stop if
        pain passes 5 of 10 or is worse the next morning. Numbness, swelling, a pop or night pain: no swaps, see a
        licensed clinician. The word of your physio, your physician and your local rules goes before this page.
      </p>
    </aside>
  )
}
