import type { Metadata, Viewport } from "next";
import type { ReactNode } from "react";
import { fontVariables } from "./fonts";
import "./globals.css";

export const metadata: Metadata = {
  title: { default: "Bellward", template: "%s · Bellward" },
  description: "Plans a fighter's camp: give the bout date and the lifting is laid around sparring.",
};

/** Every page carries the nonce of its own request (see proxy.ts); one made at build time would have none. */
export const dynamic = "force-dynamic";

export const viewport: Viewport = {
  width: "device-width",
  initialScale: 1,
  colorScheme: "light dark",
  themeColor: [
    { media: "(prefers-color-scheme: light)", color: "#dfe4e6" },
    { media: "(prefers-color-scheme: dark)", color: "#0e1317" },
  ],
};

export default function RootLayout({ children }: { readonly children: ReactNode }) {
  return (
    <html lang="en" className={fontVariables}>
      <body>{children}</body>
    </html>
  );
}
