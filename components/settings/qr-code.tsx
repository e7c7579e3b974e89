"use client";

import { useEffect, useState } from "react";
import { Skeleton } from "@/components/ui/skeleton";

/** Light modules that a reader needs around the code (ISO/IEC 18004: four). */
const QUIET = 4;

/** Dark modules as one path of unit squares. */
async function drawingOf(text: string): Promise<{ size: number; path: string }> {
  // Only who subscribes by phone pays for it.
  const { create } = await import("qrcode");
  const { size, data } = create(text, { errorCorrectionLevel: "M" }).modules;
  let path = "";
  data.forEach((dark, index) => {
    if (dark) path += `M${(index % size) + QUIET} ${Math.floor(index / size) + QUIET}h1v1h-1z`;
  });
  return { size: size + 2 * QUIET, path };
}

/** A QR code, black on white in either scheme: cameras read nothing else reliably. */
export function QrCode({ text, label }: { readonly text: string; readonly label: string }) {
  const [drawing, setDrawing] = useState<{ size: number; path: string } | null>(null);
  useEffect(() => {
    let current = true;
    void drawingOf(text).then((drawn) => current && setDrawing(drawn));
    return () => {
      current = false;
    };
  }, [text]);
  if (!drawing) return <Skeleton className="size-48" />;
  return (
    <svg
      role="img"
      aria-label={label}
      viewBox={`0 0 ${drawing.size} ${drawing.size}`}
      className="size-48 shrink-0 rounded"
      shapeRendering="crispEdges"
    >
      <rect width={drawing.size} height={drawing.size} fill="#fff" />
      <path d={drawing.path} fill="#000" />
    </svg>
  );
}
