/** What the program is not, at the foot of every page. */
export function SafetyLine({ reviewed }: { readonly reviewed?: string | null }) {
  return (
    <footer className="group-has-[[data-sheet]]/page:print:hidden mx-auto mt-8 w-full max-w-360 px-4 pb-4 md:px-6 text-sm text-ink3">
      <p>
        Supports charting. It does not replace clinical judgement, local policy, device instructions or your emergency
        plan.
      </p>
      <p>Not an alarm. Keep monitors and call bell on.</p>
      {reviewed && <p>Intervals and limits are set by your hospital. {reviewed}</p>}
    </footer>
  )
}
