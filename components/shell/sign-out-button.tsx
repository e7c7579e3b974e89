"use client";

import { useState } from "react";
import { enter } from "@/components/account/enter";
import { Button } from "@/components/ui/button";

/**
 * Ends the session and leads to the start page. What this phone keeps to read goes with it; entries that still wait for the
 * net stay for their author, and are asked about first.
 */
export function SignOutButton({ className }: { readonly className?: string }) {
  const [busy, setBusy] = useState(false);
  const [waiting, setWaiting] = useState<number | null>(null);
  const leave = async (): Promise<void> => {
    setBusy(true);
    // Fetched when pressed: nobody needs it to see a page.
    const [{ signOut }, { countWaiting, forgetReader }] = await Promise.all([
      import("next-auth/react"),
      import("@/lib/offline/device"),
    ]);
    const count = waiting === null ? await countWaiting() : 0;
    if (count > 0) {
      setWaiting(count);
      return setBusy(false);
    }
    // First the session, then what is kept: nothing private can be fetched in between.
    await signOut({ redirect: false });
    await forgetReader();
    enter("/");
  };
  return (
    <>
      {waiting === null ? null : (
        <p role="alert" className="px-6 py-1 text-xs">
          {waiting === 1 ? "1 entry was" : `${waiting} entries were`} not sent yet. They stay on this phone
          until you sign in again.
        </p>
      )}
      <Button variant="quiet" size="small" busy={busy} onClick={() => void leave()} className={className}>
        {waiting === null ? "Sign out" : "Sign out all the same"}
      </Button>
    </>
  );
}
