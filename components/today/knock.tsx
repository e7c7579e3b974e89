"use client";

import { useState } from "react";
import { Button } from "@/components/ui/button";
import { Notice } from "@/components/ui/notice";

/** What to look for: in short and after the public guidance for sport; what is done about it is a doctor's. */
const EMERGENCY =
  "A headache that gets worse, vomiting, confusion, drowsiness, a fit, weakness, trouble seeing or speaking, or neck pain: get emergency care now. Do not drive and do not stay alone today.";

interface KnockProps {
  readonly taken: boolean;
  readonly onTaken: () => void;
}

/** "Took a knock to the head": asked once more with what happens next, and never taken back here. */
export function Knock({ taken, onTaken }: KnockProps) {
  const [asking, setAsking] = useState(false);
  if (taken)
    return (
      <Notice tone="caution" title="You took a knock to the head" className="mt-3">
        <p>Stop for today. No sparring and no lifting is planned until the medic says otherwise.</p>
        <p className="mt-1">{EMERGENCY}</p>
        <p className="mt-1 font-semibold">This is no medical clearance. See a licensed doctor.</p>
      </Notice>
    );
  if (!asking)
    return (
      <Button wide className="mt-3 min-h-12" onClick={() => setAsking(true)}>
        Took a knock to the head
      </Button>
    );
  return (
    <div className="mt-3 rounded-r border-l-4 border-brass bg-brass-tint px-3.5 py-2.5 text-sm text-brass-text">
      <h3 className="font-semibold">A knock to the head?</h3>
      <ul className="mt-1 list-disc pl-5">
        <li>You stop for today. The session’s load is kept.</li>
        <li>Sparring and lifting stop being planned until the medic says otherwise.</li>
        <li>Your head coach and the medic are told.</li>
        <li>You cannot take it back here; the medic decides.</li>
      </ul>
      <p className="mt-2">{EMERGENCY}</p>
      <p className="mt-2 font-semibold">This is no medical clearance. See a licensed doctor.</p>
      <div className="mt-3 grid grid-cols-2 gap-2">
        <Button
          variant="danger"
          className="min-h-12 whitespace-normal"
          onClick={() => {
            setAsking(false);
            onTaken();
          }}
        >
          Yes, tell them
        </Button>
        <Button className="min-h-12" onClick={() => setAsking(false)}>
          No, go back
        </Button>
      </div>
    </div>
  );
}
