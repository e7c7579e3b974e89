import { athletes, memberships, teams, users } from "@/db/schema";
import type { Database } from "@/db/client";
import type { Role } from "@/lib/policy";
import type { TeamContext } from "@/lib/services/context";

let counter = 0;

/** A team with one member a role; athlete and guest are tied to one athlete. Invented people. */
export async function teamWithEveryRole(db: Database, now = new Date("2026-11-26T12:00:00Z")) {
  const n = ++counter;
  const [team] = await db
    .insert(teams)
    .values({ name: `Team ${n}`, timeZone: "Europe/Lisbon" })
    .returning();
  if (!team) throw new Error("no team");
  const [athlete] = await db
    .insert(athletes)
    .values({
      teamId: team.id,
      name: `Athlete ${n}`,
      trainingAge: "intermediate",
      strikingBase: "boxing",
      liftsPerWeek: 3,
      freeHours: [1, 2, 3, 4, 5, 6, 7].map((weekday) => ({ weekday, from: "10:00", to: "20:00" })),
    })
    .returning();
  if (!athlete) throw new Error("no athlete");
  const roles: Role[] = ["head", "strength", "skills", "medic", "athlete", "guest"];
  const people = await db
    .insert(users)
    .values(
      roles.map((role) => ({
        name: `${role} ${n}`,
        email: `${role}-${n}@team.example`,
        passwordHash: "!",
        timeZone: "Europe/Lisbon",
        currentTeamId: team.id,
      })),
    )
    .returning();
  const members = roles.map((role, index) => {
    const user = people[index];
    if (!user) throw new Error("no user");
    return {
      teamId: team.id,
      userId: user.id,
      role,
      athleteId: role === "athlete" || role === "guest" ? athlete.id : null,
    };
  });
  await db.insert(memberships).values(members);
  const as = (role: Role, at = now): TeamContext => {
    const member = members.find((candidate) => candidate.role === role);
    if (!member) throw new Error(`no ${role}`);
    return {
      db,
      teamId: team.id,
      userId: member.userId,
      member: { role, athleteId: member.athleteId },
      now: at,
    };
  };
  return { team, athlete, as, people };
}
