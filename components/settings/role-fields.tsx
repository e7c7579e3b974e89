"use client";

import { useFormContext, useWatch } from "react-hook-form";
import { Field } from "@/components/ui/field";
import { Select } from "@/components/ui/select";
import { ROLES, ROLE_TITLES, isStaff, type Role } from "@/lib/policy";
import type { RoleChange } from "@/lib/schemas/account";
import type { FollowedAthlete } from "./feed-words";

/** What each role is for, in one line. */
const ROLE_HINTS: Record<Role, string> = {
  head: "Everything in the team but medical notes; invites and removes people.",
  strength: "Plans the lifting, keeps the house rules.",
  skills: "Runs the sport sessions; sees lifting on the calendar.",
  medic: "Sets and lifts holds; changes no plan.",
  athlete: "Sees their own camp.",
  guest: "Sees one athlete’s calendar, and no numbers.",
};

const ROLE_CHOICES = ROLES.map((role) => ({ value: role, label: ROLE_TITLES[role] }));

interface RoleFieldsProps {
  readonly athletes: readonly FollowedAthlete[];
}

/** Role, and for an athlete or a guest whose camp it is about. */
export function RoleFields({ athletes }: RoleFieldsProps) {
  const { register, control, setValue, formState } = useFormContext<RoleChange>();
  const role = useWatch({ control, name: "role" });
  const tied = !isStaff(role);
  const follow = (next: Role): void =>
    setValue("athleteId", isStaff(next) ? null : (athletes[0]?.id ?? null));
  return (
    <>
      <Field label="Role" hint={ROLE_HINTS[role]} error={formState.errors.role?.message}>
        <Select
          choices={ROLE_CHOICES}
          {...register("role", {
            onChange: (event: { target: { value: string } }) => follow(event.target.value as Role),
          })}
        />
      </Field>
      {tied ? (
        <Field
          label={role === "athlete" ? "Who this is in the roster" : "Whose camp"}
          hint={athletes.length === 0 ? "Add the athlete to the roster first." : undefined}
          error={formState.errors.athleteId?.message}
        >
          <Select
            choices={athletes.map(({ id, name }) => ({ value: id, label: name }))}
            {...register("athleteId", { setValueAs: (value: string | null) => value || null })}
          />
        </Field>
      ) : null}
    </>
  );
}
