"use client";

import { zodResolver } from "@hookform/resolvers/zod";
import { FormProvider, useForm } from "react-hook-form";
import { Button } from "@/components/ui/button";
import { Notice } from "@/components/ui/notice";
import { useSaving } from "@/components/ui/use-saving";
import { athleteFormSchema, type AthleteForm } from "@/lib/schemas/athlete";
import { ProfileFields } from "./profile-fields";

interface ProfileFormProps {
  readonly start: AthleteForm;
  readonly minor: boolean;
  /** The act, as the button says it. */
  readonly act: string;
  readonly save: (form: AthleteForm) => Promise<void>;
}

/** The form of a profile, new or old. */
export function ProfileForm({ start, minor, act, save }: ProfileFormProps) {
  const form = useForm<AthleteForm>({ resolver: zodResolver(athleteFormSchema), defaultValues: start });
  const { submit, problem } = useSaving(form, save);
  return (
    <FormProvider {...form}>
      <form noValidate onSubmit={submit}>
        <ProfileFields minor={minor} />
        {problem ? <Notice tone="error" role="alert" title={problem} className="mt-3.5" /> : null}
        <Button type="submit" variant="primary" busy={form.formState.isSubmitting} className="mt-4">
          {act}
        </Button>
      </form>
    </FormProvider>
  );
}
