import { expect, test } from "@playwright/test";
import { isoFromDay } from "@/lib/engine";
import type { Day } from "@/lib/engine/types";
import {
  dragTo,
  makeCamp,
  openCamp,
  rail,
  readCamp,
  saveElsewhere,
  sessionOn,
  signInAs,
  type TestCamp,
} from "./camp-scene";

let camp: TestCamp;
const on = (weeks: number, shift = 0): Day => (camp.saturday(weeks) + shift) as Day;

test.beforeEach(async ({ context }, info) => {
  await signInAs(context, "head");
  camp = await makeCamp(context.request, `Together ${info.title.slice(0, 60)}`);
});

const moveSparring = (weeks: number, shift: number) =>
  ({
    kind: "sport.edit",
    sportId: "",
    scope: "this",
    values: { date: isoFromDay(on(weeks, shift)) },
  }) as const;

test("another coach's save appears on an open page without a reload", async ({ page, browser }) => {
  await openCamp(page, camp.id);
  await page.evaluate(() => Object.assign(window, { sameDocument: true }));
  const other = await browser.newContext();
  await signInAs(other, "skills");
  const view = await readCamp(other.request, camp.id);
  const hard = view.sport.find((session) => session.day === on(4) && session.kind === "hard-sparring");
  await saveElsewhere(other.request, camp.id, { ...moveSparring(4, -1), sportId: hard?.id ?? "" });
  await expect(sessionOn(page, on(4, -1), "Hard sparring")).toBeVisible();
  await expect(page.getByText(/Mirela Obradu: Moved Hard sparring/)).toBeVisible();
  expect(await page.evaluate(() => "sameDocument" in window)).toBe(true);
  await other.close();
});

test("a change that is being tried stays when someone else saves, measured against the new camp", async ({
  page,
  browser,
}) => {
  await openCamp(page, camp.id);
  await dragTo(page, sessionOn(page, on(5), "Hard sparring"), on(5, -2));
  await page.mouse.up();
  const other = await browser.newContext();
  await signInAs(other, "skills");
  const hard = (await readCamp(other.request, camp.id)).sport.find(
    (session) => session.day === on(4) && session.kind === "hard-sparring",
  );
  await saveElsewhere(other.request, camp.id, { ...moveSparring(4, -1), sportId: hard?.id ?? "" });
  await expect(rail(page)).toContainText("Changed by someone else meanwhile");
  await expect(rail(page)).toContainText("Mirela Obradu");
  await expect(sessionOn(page, on(4, -1), "Hard sparring")).toBeVisible();
  await expect(sessionOn(page, on(5, -2), "Hard sparring")).toHaveAccessibleName(/not saved/);
  await rail(page).getByRole("button", { name: /^Save/ }).click();
  await expect(page.getByText(/^Saved\./)).toBeVisible();
  const saved = await readCamp(other.request, camp.id);
  expect(
    saved.sport.filter((session) => session.day === on(5, -2) || session.day === on(4, -1)),
  ).not.toHaveLength(0);
  await other.close();
});

test("a stale save says who changed what, and can be saved on top or discarded", async ({
  page,
  browser,
}) => {
  // This page is told of nothing: as after a lost connection.
  await page.route("**/api/camps/*/events", (route) => route.abort());
  await page.route(`**/api/camps/${camp.id}`, (route) => route.abort());
  await openCamp(page, camp.id);
  await dragTo(page, sessionOn(page, on(5), "Hard sparring"), on(5, -2));
  await page.mouse.up();
  const other = await browser.newContext();
  await signInAs(other, "skills");
  const hard = (await readCamp(other.request, camp.id)).sport.find(
    (session) => session.day === on(4) && session.kind === "hard-sparring",
  );
  await saveElsewhere(other.request, camp.id, { ...moveSparring(4, -1), sportId: hard?.id ?? "" });

  await rail(page).getByRole("button", { name: /^Save/ }).click();
  await expect(rail(page)).toContainText("Changed by someone else meanwhile");
  await expect(rail(page)).toContainText(/Mirela Obradu, .*: Moved Hard sparring/);
  await expect(sessionOn(page, on(4, -1), "Hard sparring")).toBeVisible();
  await expect(rail(page).getByRole("button", { name: "Discard" })).toBeVisible();
  expect((await readCamp(other.request, camp.id)).revision).toBe(2);

  await rail(page).getByRole("button", { name: /^Save/ }).click();
  await expect(page.getByText(/^Saved\./)).toBeVisible();
  expect((await readCamp(other.request, camp.id)).revision).toBe(3);
  await other.close();
});

test("every save is listed with what it knocked on, and any can be put back as a change of its own", async ({
  page,
  context,
}) => {
  const hard = (await readCamp(context.request, camp.id)).sport.find(
    (session) => session.day === on(5) && session.kind === "hard-sparring",
  );
  await saveElsewhere(context.request, camp.id, { ...moveSparring(5, -2), sportId: hard?.id ?? "" });
  await page.goto(`/camps/${camp.id}/changes`);
  const row = page
    .getByRole("listitem")
    .filter({ hasText: /^2?Moved Hard sparring|Moved Hard sparring/ })
    .first();
  await row.getByText("What it knocked on").click();
  await expect(row.getByText(/in all/).first()).toBeVisible();
  await row.getByRole("button", { name: "Put back", exact: true }).click();
  await row.getByRole("button", { name: "Put change 2 back" }).click();
  await expect(page.getByText(/Puts back change 2\./)).toBeVisible();
  await expect(page.getByText(/Put back by change 3\./)).toBeVisible();
  await openCamp(page, camp.id);
  await expect(sessionOn(page, on(5), "Hard sparring")).toBeVisible();
  await expect(sessionOn(page, on(5, -2), "Hard sparring")).toHaveCount(0);
});
