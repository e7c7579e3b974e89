"use client";

import dynamic from "next/dynamic";
import { useEffect, useState, useSyncExternalStore } from "react";
import type { Desk } from "@/components/camp/use-desk";
import { Button } from "@/components/ui/button";
import { useWaiting } from "@/lib/query/suggestions";
import { waitingText } from "./waiting-text";

// Fetched when it is opened: the page itself only counts.
const WaitingPanel = dynamic(() => import("./waiting-panel").then((module) => module.WaitingPanel), {
  ssr: false,
});

// The board leads here by the part of the address that the server never sees.
const isLedHere = (): boolean => window.location.hash === "#waiting";
function onHash(tell: () => void): () => void {
  window.addEventListener("hashchange", tell);
  return () => window.removeEventListener("hashchange", tell);
}

/** How much of a camp waits for a coach, and the panel where it is decided. Silent where nothing ever did. */
export function Waiting({ desk }: { readonly desk: Desk }) {
  const { view } = desk;
  const { data, refetch } = useWaiting(view.id);
  const [chosen, setChosen] = useState<boolean | null>(null);
  const led = useSyncExternalStore(onHash, isLedHere, () => false);
  const open = chosen ?? led;
  const behind = data !== undefined && data.revision < view.revision;
  useEffect(() => {
    if (behind) void refetch();
  }, [behind, refetch]);
  if (!data) return null;
  const text = waitingText(data);
  if (text === "" && data.decisions.length === 0) return null;
  return (
    <div id="waiting">
      <p className="mb-3 flex flex-wrap items-center gap-3 text-sm">
        <b className="font-semibold">{text || "Nothing waits for you"}</b>
        <Button size="small" aria-expanded={open} onClick={() => setChosen(!open)}>
          {open ? "Close" : "Look at it"}
        </Button>
      </p>
      {open ? <WaitingPanel desk={desk} waiting={data} /> : null}
    </div>
  );
}
