/** What the product must not be taken for; at the foot of the public pages. */
export const Cautions = () => (
  <footer className="border-t border-line py-6 text-sm text-ink-2 print:hidden">
    <h2 className="mb-2 font-semibold text-ink">Before you use this</h2>
    <ul className="grid gap-x-10 gap-y-2 md:grid-cols-2 xl:grid-cols-3">
      <li>
        Rapid weight loss can injure or kill. Work with a licensed physician and a registered dietitian, and
        follow your commission’s rules. Bellward gives no dehydration protocol.
      </li>
      <li>
        After a knock to the head, contact stops until a medic says otherwise. Nothing here is a medical
        clearance.
      </li>
      <li>
        Loads come from estimates. A qualified coach watches heavy and ballistic lifts. For an athlete under
        18 weight descent is switched off.
      </li>
    </ul>
  </footer>
);
