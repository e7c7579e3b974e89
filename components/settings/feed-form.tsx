"use client";

import { useState } from "react";
import { Button } from "@/components/ui/button";
import { Checkbox } from "@/components/ui/checkbox";
import { Actions } from "@/components/ui/dialog";
import { Field, FieldGroup } from "@/components/ui/field";
import { Notice } from "@/components/ui/notice";
import { Select } from "@/components/ui/select";
import { can, type Role } from "@/lib/policy";
import { useCreateFeed } from "@/lib/query/feeds";
import type { FeedForm as Form, NewFeed } from "@/lib/schemas/feed";
import type { FollowedAthlete } from "./feed-words";

interface FeedFormProps {
  readonly role: Role;
  readonly athletes: readonly FollowedAthlete[];
  readonly onMade: (made: NewFeed) => void;
  readonly onClose: () => void;
}

/** Asks whose calendar, and how much its titles say. Athletes and guests have one athlete to follow. */
export function FeedForm({ role, athletes, onMade, onClose }: FeedFormProps) {
  const team = can({ role, athleteId: null }, "feeds.team");
  const [scope, setScope] = useState<Form["scope"]>(team ? "team" : "athlete");
  const [athleteId, setAthleteId] = useState(athletes[0]?.id ?? "");
  const [discreet, setDiscreet] = useState(false);
  const create = useCreateFeed();
  const submit = (): void => {
    const form: Form = scope === "team" ? { scope, discreet } : { scope, athleteId, discreet };
    create.mutate(form, { onSuccess: onMade });
  };
  return (
    <form
      onSubmit={(event) => {
        event.preventDefault();
        submit();
      }}
    >
      {team ? (
        <FieldGroup label="Whose calendar">
          <Checkbox
            type="radio"
            name="scope"
            label="The whole team"
            checked={scope === "team"}
            onChange={() => setScope("team")}
          />
          <Checkbox
            type="radio"
            name="scope"
            label="One athlete"
            checked={scope === "athlete"}
            disabled={athletes.length === 0}
            onChange={() => setScope("athlete")}
          />
        </FieldGroup>
      ) : null}
      {team && scope === "athlete" ? (
        <Field label="Athlete" className="mb-2">
          <Select
            choices={athletes.map(({ id, name }) => ({ value: id, label: name }))}
            value={athleteId}
            onChange={(event) => setAthleteId(event.target.value)}
          />
        </Field>
      ) : null}
      <Checkbox
        label="Discreet"
        hint="Titles say Training, Sport, Bout or Appointment and nothing else. For a screen that others see."
        checked={discreet}
        onChange={(event) => setDiscreet(event.target.checked)}
      />
      {create.error ? (
        <Notice tone="error" role="alert" title={create.error.message} className="mt-3" />
      ) : null}
      <Actions>
        <Button
          type="submit"
          variant="primary"
          busy={create.isPending}
          disabled={scope === "athlete" && athleteId === ""}
        >
          Make the address
        </Button>
        <Button onClick={onClose}>Close</Button>
      </Actions>
    </form>
  );
}
