"use client";

import { Button } from "@/components/ui/button";
import { Notice } from "@/components/ui/notice";

export default function ExercisesError({ reset }: { readonly reset: () => void }) {
  return (
    <Notice tone="error" role="alert" title="This exercise could not be shown.">
      <p>Nothing was changed.</p>
      <Button size="small" className="mt-2" onClick={reset}>
        Try again
      </Button>
    </Notice>
  );
}
