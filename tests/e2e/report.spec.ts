import { expect, test } from "@playwright/test";
import { and, eq } from "drizzle-orm";
import { openDatabase } from "@/db/client";
import { sessions } from "@/db/schema";
import { browserTestServer } from "../setup/e2e";
import { freshCamp, freshTeam } from "./team-scene";

/** The bout as if it had been an hour ago: a test cannot wait for it. */
async function boutWas(campId: string): Promise<void> {
  const { db, sql } = openDatabase(browserTestServer().databaseUrl, { max: 1 });
  try {
    await db
      .update(sessions)
      .set({ startsAt: new Date(Date.now() - 3_600_000) })
      .where(and(eq(sessions.campId, campId), eq(sessions.source, "bout")));
  } finally {
    await sql.end();
  }
}

test("after the bout the head coach writes down how it ended; an ordered stand-down becomes a hold; the file is there", async ({
  browser,
}) => {
  const team = await freshTeam(browser);
  const head = await team.pageOf("head");
  await head.goto("/board");
  const campId = await freshCamp(head.context(), team.athlete.id);
  await head.goto(`/camps/${campId}/report`);
  await expect(head.getByText("The bout has not been yet")).toBeVisible();
  await expect(head.getByRole("table", { name: "Sessions planned and done" })).toContainText("Hard sparring");

  await boutWas(campId);
  await head.reload();
  await head.getByRole("button", { name: "Write down how it ended" }).click();
  const dialog = head.getByRole("dialog", { name: "How the bout ended" });
  await dialog.getByLabel("Result").selectOption("lost");
  await dialog.getByLabel("How").fill("Stopped in round 2");
  await dialog.getByLabel("Ended by blows to the head, or the referee stopped it").check();
  await dialog.getByLabel("Stand-down, days").fill("900");
  await dialog.getByRole("button", { name: "Save" }).click();
  await expect(dialog.getByText("0 to 730 days.")).toBeVisible();
  await dialog.getByLabel("Stand-down, days").fill("30");
  await dialog.getByRole("button", { name: "Save" }).click();
  await expect(dialog).toHaveCount(0);
  await expect(head.getByText("Lost, Stopped in round 2")).toBeVisible();
  await expect(head.getByText(/^No contact until /)).toBeVisible();

  const download = head.waitForEvent("download");
  await head.getByRole("link", { name: "CSV" }).click();
  expect((await download).suggestedFilename()).toMatch(/\.csv$/);

  await head.goto(`/athletes/${team.athlete.id}`);
  await expect(head.getByRole("heading", { name: "Holds" })).toBeVisible();

  const athlete = await team.pageOf("athlete");
  await athlete.setViewportSize({ width: 390, height: 844 });
  await athlete.goto(`/camps/${campId}/report`);
  await expect(athlete.getByText("Lost, Stopped in round 2")).toBeVisible();
  await expect(athlete.getByRole("button", { name: "Change it" })).toHaveCount(0);
  await head.context().close();
  await athlete.context().close();
});
