"use client";

import { useState } from "react";
import { Button } from "@/components/ui/button";
import { Panel } from "@/components/ui/panel";
import { showToast } from "@/components/ui/toasts";
import { ROLE_TITLES } from "@/lib/policy";
import { usePeople, useRevokeInvite } from "@/lib/query/people";
import type { InviteView, PeopleView, PersonView } from "@/lib/schemas/account";
import type { FollowedAthlete } from "./feed-words";
import { InviteDialog } from "./invite-dialog";
import { RemoveDialog, RoleDialog } from "./person-dialogs";

interface PeoplePanelProps {
  readonly initial: PeopleView;
  readonly athletes: readonly FollowedAthlete[];
  /** May invite, change and remove people. */
  readonly manages: boolean;
}

type Shown = { readonly step: "invite" } | { readonly step: "role" | "remove"; readonly person: PersonView };

const LINE = "flex flex-wrap items-center justify-between gap-x-4 gap-y-2 py-2";

const until = (instant: string): string =>
  new Intl.DateTimeFormat("en-GB", { day: "numeric", month: "short" }).format(new Date(instant));

function InviteLine({ invite }: { readonly invite: InviteView }) {
  const revoke = useRevokeInvite();
  const takeBack = (): void =>
    revoke.mutate(invite.id, {
      onError: (error) => showToast(error.message, { tone: "error" }),
      onSuccess: () => showToast(`The invitation to ${invite.email} is taken back.`),
    });
  return (
    <li className={LINE}>
      <span className="min-w-0">
        <span className="block break-words">{invite.email}</span>
        <span className="block text-sm text-ink-2" suppressHydrationWarning>
          {ROLE_TITLES[invite.role]},{" "}
          {invite.expired ? "not accepted in time" : `invited, until ${until(invite.expiresAt)}`}
        </span>
      </span>
      <Button size="small" busy={revoke.isPending} onClick={takeBack}>
        Take back
      </Button>
    </li>
  );
}

/** Who is in the team; the head coach invites, changes roles and takes people out. */
export function PeoplePanel({ initial, athletes, manages }: PeoplePanelProps) {
  const { data } = usePeople(initial);
  const [shown, setShown] = useState<Shown | null>(null);
  const close = (): void => setShown(null);
  const nameOf = (id: string | null): string | null => athletes.find((one) => one.id === id)?.name ?? null;
  return (
    <Panel
      title="People"
      actions={
        manages ? (
          <Button size="small" onClick={() => setShown({ step: "invite" })}>
            Invite someone
          </Button>
        ) : null
      }
    >
      <ul className="divide-y divide-line-soft">
        {data.people.map((person) => {
          const tied = nameOf(person.athleteId);
          return (
            <li key={person.id} className={LINE}>
              <span className="min-w-0">
                <span className="font-semibold">{person.name}</span>
                {person.self ? <span className="text-ink-2"> (you)</span> : null}
                <span className="block text-sm break-words text-ink-2">
                  {ROLE_TITLES[person.role]}
                  {tied && person.role === "guest" ? ` of ${tied}` : ""}, {person.email}
                </span>
              </span>
              {manages ? (
                <span className="flex gap-2">
                  <Button
                    size="small"
                    aria-label={`Change the role of ${person.name}`}
                    onClick={() => setShown({ step: "role", person })}
                  >
                    Change role
                  </Button>
                  <Button
                    size="small"
                    aria-label={`Take ${person.name} out of the team`}
                    onClick={() => setShown({ step: "remove", person })}
                  >
                    Take out
                  </Button>
                </span>
              ) : null}
            </li>
          );
        })}
        {data.invites.map((invite) => (
          <InviteLine key={invite.id} invite={invite} />
        ))}
      </ul>
      {shown?.step === "invite" ? <InviteDialog athletes={athletes} onClose={close} /> : null}
      {shown?.step === "role" ? (
        <RoleDialog person={shown.person} athletes={athletes} onClose={close} />
      ) : null}
      {shown?.step === "remove" ? <RemoveDialog person={shown.person} onClose={close} /> : null}
    </Panel>
  );
}
