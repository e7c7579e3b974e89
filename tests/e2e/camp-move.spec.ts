import { expect, test } from "@playwright/test";
import type { Day } from "@/lib/engine/types";
import {
  dayName,
  dragTo,
  ghostOn,
  makeCamp,
  openCamp,
  rail,
  sessionOn,
  signInAs,
  type TestCamp,
} from "./camp-scene";

let camp: TestCamp;
let saturday: Day;
let thursday: Day;

test.beforeEach(async ({ context, page }, info) => {
  await signInAs(context, "head");
  camp = await makeCamp(context.request, `Move ${info.title.slice(0, 60)}`);
  saturday = camp.saturday(5);
  // The Thursday of the same camp week, in the same row.
  thursday = (saturday - 2) as Day;
  await openCamp(page, camp.id);
});

test("a drag shows ghosts, landing places and the knock-on, and saves nothing until it is told to", async ({
  page,
}) => {
  await dragTo(page, sessionOn(page, saturday, "Hard sparring"), thursday);
  await expect(rail(page)).toContainText(
    `Moving Hard sparring from ${dayName(saturday)} to ${dayName(thursday)}`,
  );
  await expect(rail(page).getByRole("button", { name: /^Save/ })).toBeDisabled();
  await page.mouse.up();
  await expect(rail(page)).toContainText("Not saved yet.");
  await expect(sessionOn(page, thursday, "Hard sparring")).toHaveAccessibleName(/moved from .*, not saved/);
  await expect(ghostOn(page, saturday, "Hard sparring")).toBeVisible();
  await expect(rail(page)).toContainText("What it knocks on");

  await page.reload();
  await expect(sessionOn(page, saturday, "Hard sparring")).toBeVisible();
  await expect(sessionOn(page, thursday, "Hard sparring")).toHaveCount(0);
});

test("saving keeps the move and the knock-on, says who is told, and can be put back from there", async ({
  page,
}) => {
  await dragTo(page, sessionOn(page, saturday, "Hard sparring"), thursday);
  await page.mouse.up();
  const effects = await rail(page).getByRole("listitem").allInnerTexts();
  expect(effects.length).toBeGreaterThan(0);
  await rail(page)
    .getByRole("button", { name: /^Save and tell \d+ (people|person)$/ })
    .click();
  await expect(page.getByText(/^Saved\. \d+ (people are|person is) being told\.$/)).toBeVisible();
  await expect(rail(page)).toHaveCount(0);
  await expect(sessionOn(page, thursday, "Hard sparring")).toHaveAccessibleName(/^(?!.*not saved)/);
  await expect(ghostOn(page, saturday, "Hard sparring")).toHaveCount(0);

  await page.reload();
  await expect(sessionOn(page, thursday, "Hard sparring")).toBeVisible();
  await page.goto(`/camps/${camp.id}/changes`);
  await expect(page.getByText(/^Moved Hard sparring/)).toBeVisible();
});

test("the message after a save puts the change back", async ({ page }) => {
  await dragTo(page, sessionOn(page, saturday, "Hard sparring"), thursday);
  await page.mouse.up();
  await rail(page).getByRole("button", { name: /^Save/ }).click();
  await page.getByRole("button", { name: "Put back", exact: true }).click();
  await expect(sessionOn(page, saturday, "Hard sparring")).toBeVisible();
  await expect(sessionOn(page, thursday, "Hard sparring")).toHaveCount(0);
});

test("put it back leaves the camp as it was", async ({ page }) => {
  await dragTo(page, sessionOn(page, saturday, "Hard sparring"), thursday);
  await page.mouse.up();
  await rail(page).getByRole("button", { name: "Put it back" }).click();
  await expect(sessionOn(page, saturday, "Hard sparring")).toBeVisible();
  await expect(rail(page)).toHaveCount(0);
});

test("a session is picked up, carried and dropped by keys, and what it knocks on is said aloud", async ({
  page,
}) => {
  await sessionOn(page, saturday, "Hard sparring").focus();
  await page.keyboard.press("m");
  await expect(page.getByText(/^Picked up\./)).toBeAttached();
  await page.keyboard.press("ArrowLeft");
  await page.keyboard.press("ArrowLeft");
  await expect(sessionOn(page, thursday, "Hard sparring")).toBeFocused();
  await page.keyboard.press("PageDown");
  await expect(sessionOn(page, thursday, "Hard sparring")).toHaveAccessibleName(/11:30/);
  await expect(page.getByText(/^Hard sparring, Thu .* 11:30\. .+/)).toBeAttached();
  await page.keyboard.press("Enter");
  const heading = rail(page).getByRole("heading", {
    name: /^Moving Hard sparring from .* 11:00 to .* 11:30$/,
  });
  await expect(heading).toBeFocused();
  await rail(page).getByRole("button", { name: /^Save/ }).focus();
  await page.keyboard.press("Enter");
  await expect(page.getByText(/^Saved\./)).toBeVisible();
});

test("Escape lets a carried session go to where it was", async ({ page }) => {
  await sessionOn(page, saturday, "Hard sparring").focus();
  await page.keyboard.press("Space");
  await page.keyboard.press("ArrowUp");
  await expect(sessionOn(page, (saturday - 7) as Day, "Hard sparring")).toHaveCount(2);
  await page.keyboard.press("Escape");
  await expect(sessionOn(page, saturday, "Hard sparring")).toBeFocused();
  await expect(rail(page)).toHaveCount(0);
});

test("arrows lead from session to session, and Enter opens one", async ({ page }) => {
  await sessionOn(page, saturday, "Hard sparring").focus();
  await page.keyboard.press("ArrowDown");
  await expect(sessionOn(page, (saturday + 7) as Day, "Hard sparring")).toBeFocused();
  await page.keyboard.press("Enter");
  await expect(page.getByRole("region", { name: "Details" })).toContainText("Hard sparring");
});

test("a lift that is dropped is pinned, and the pin can be let go", async ({ page }) => {
  const lift = page.getByRole("button", { name: /^Strength A, .* sets$/ }).nth(2);
  await lift.click();
  const details = page.getByRole("region", { name: "Details" });
  await expect(details).toContainText("Why it stands here");
  await expect(details.getByText("Working sets")).toBeVisible();
  await details.getByRole("button", { name: "Pin it here" }).click();
  await rail(page).getByRole("button", { name: /^Save/ }).click();
  await expect(details).toContainText("Pinned by a coach");
  await details.getByRole("button", { name: "Let it go" }).click();
  await expect(rail(page)).toContainText("Letting Strength A go from its pin");
});

test("a pin that breaks a rule is allowed, marked and listed", async ({ page }) => {
  const lift = page.getByRole("button", { name: /^Strength A, .* sets$/ }).nth(1);
  await lift.click();
  const details = page.getByRole("region", { name: "Details" });
  const hard = new Date((saturday + 3) * 86_400_000).toISOString().slice(0, 10);
  await details.getByLabel("Day").fill(hard);
  await details.getByLabel("Time").fill("15:00");
  await details.getByRole("button", { name: "Try it" }).first().click();
  await expect(rail(page)).toContainText("Rules it breaks");
  await rail(page).getByRole("button", { name: /^Save/ }).click();
  await expect(sessionOn(page, (saturday + 3) as Day, "Strength A")).toHaveAccessibleName(
    /pinned, breaks a rule/,
  );
  await details.getByRole("button", { name: "Close the details" }).click();
  await expect(page.getByText(/rules? (is|are) broken/)).toBeVisible();
});
