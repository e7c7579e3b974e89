"use client";

import { enter } from "@/components/account/enter";
import { useSwitchTeam } from "@/lib/query/account";
import { Button } from "@/components/ui/button";
import { Notice } from "@/components/ui/notice";
import { Panel } from "@/components/ui/panel";
import { ROLE_TITLES } from "@/lib/policy";
import type { AccountView } from "@/lib/schemas/account";

/** The teams one is in, for someone in several. */
export function TeamsPanel({ teams }: Pick<AccountView, "teams">) {
  const change = useSwitchTeam();
  // Everything on the page belongs to the other team: a full load.
  const goTo = (id: string): void => change.mutate(id, { onSuccess: () => enter("/board") });
  return (
    <Panel title="Your teams">
      <ul className="divide-y divide-line-soft">
        {teams.map((team) => (
          <li key={team.id} className="flex flex-wrap items-center justify-between gap-3 py-2">
            <span>
              <span className="font-semibold">{team.name}</span>
              <span className="block text-sm text-ink-2">{ROLE_TITLES[team.role]}</span>
            </span>
            {team.current ? (
              <span className="text-sm text-ink-2">Shown now</span>
            ) : (
              <Button size="small" busy={change.isPending} onClick={() => goTo(team.id)}>
                Go to {team.name}
              </Button>
            )}
          </li>
        ))}
      </ul>
      {change.error ? <Notice tone="error" role="alert" title={change.error.message} /> : null}
    </Panel>
  );
}
