import type { Metadata } from "next";
import { ResetRequestForm } from "@/components/account/reset-forms";
import { NarrowPage } from "@/components/shell/narrow-page";

export const metadata: Metadata = { title: "Set a new password" };

export default function ResetPage() {
  return (
    <NarrowPage title="Set a new password" lead="We mail you a link that sets it.">
      <ResetRequestForm />
    </NarrowPage>
  );
}
