"use client";

import { useState } from "react";
import { Button } from "@/components/ui/button";

/** Ends the session and leads to the start page. */
export function SignOutButton({ className }: { readonly className?: string }) {
  const [busy, setBusy] = useState(false);
  const leave = async (): Promise<void> => {
    setBusy(true);
    // Fetched when pressed: nobody needs it to see a page.
    const { signOut } = await import("next-auth/react");
    await signOut({ callbackUrl: "/" });
  };
  return (
    <Button variant="quiet" size="small" busy={busy} onClick={() => void leave()} className={className}>
      Sign out
    </Button>
  );
}
