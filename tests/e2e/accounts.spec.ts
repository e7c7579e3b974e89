import { randomUUID } from "node:crypto";
import { expect, test, type Page } from "@playwright/test";
import { linkTo, onlyMailTo } from "./caught-mail";
import { PASSWORD, freshTeam } from "./team-scene";

async function signIn(page: Page, email: string, password: string): Promise<void> {
  await page.getByLabel("E-mail").fill(email);
  await page.getByLabel("Password", { exact: true }).fill(password);
  await page.getByRole("button", { name: "Sign in" }).click();
}

const heading = (page: Page, name: string) => page.getByRole("heading", { level: 1, name });

test("a wrong password is refused without saying which part is wrong; the right one leads where one wanted to go", async ({
  page,
  browser,
}) => {
  const team = await freshTeam(browser);
  await page.goto("/timetable");
  await expect(heading(page, "Sign in")).toBeVisible();
  await signIn(page, team.email("head"), "not the password");
  await expect(page.getByRole("alert").filter({ hasText: "E-mail or password is wrong." })).toBeVisible();
  // Somebody who has no account hears the same.
  await signIn(page, `${randomUUID()}@nobody.example`, "not the password");
  await expect(page.getByRole("alert").filter({ hasText: "E-mail or password is wrong." })).toBeVisible();
  await signIn(page, team.email("head"), PASSWORD);
  await expect(heading(page, "Timetable")).toBeVisible();
  expect(new URL(page.url()).pathname).toBe("/timetable");
});

test("signing out ends the session: the pages of the team ask to sign in again", async ({ browser }) => {
  const team = await freshTeam(browser);
  const page = await team.pageOf("strength");
  await page.goto("/board");
  await page.getByRole("button", { name: new RegExp(team.name) }).click();
  await page.getByRole("button", { name: "Sign out" }).click();
  await page.waitForURL((url) => url.pathname === "/");
  await page.goto("/board");
  await expect(heading(page, "Sign in")).toBeVisible();
  expect((await page.request.get("/api/camps")).status()).toBe(401);
  await page.context().close();
});

test("a reset link from the mail sets a new password once, and ends the sessions that there were", async ({
  page,
  browser,
}) => {
  const team = await freshTeam(browser);
  const email = team.email("skills");
  const old = await team.pageOf("skills");
  await old.goto("/board");
  await expect(heading(old, "Board")).toBeVisible();

  await page.goto("/sign-in");
  await page.getByRole("link", { name: "Forgot the password?" }).click();
  // The sign-in page has a field of the same name.
  await expect(page.getByRole("heading", { name: "Set a new password" })).toBeVisible();
  await page.getByLabel("E-mail").fill(email);
  await page.getByRole("button", { name: "Send me a link" }).click();
  await expect(page.getByRole("status").filter({ hasText: "Check your mail" })).toBeVisible();

  const link = linkTo(await onlyMailTo(email), "/reset/");
  await page.goto(link);
  // Looking at it, as a mail scanner does, uses nothing up.
  await page.reload();
  await page.getByLabel("New password").fill("short");
  await page.getByRole("button", { name: "Set the password" }).click();
  await expect(page.getByText("At least 10 characters.", { exact: true })).toBeVisible();
  await page.getByLabel("New password").fill("another password for tests");
  await page.getByRole("button", { name: "Set the password" }).click();
  await expect(page.getByText("The password is changed. Sign in with the new one.")).toBeVisible();

  expect((await old.request.get("/api/camps")).status()).toBe(401);
  await old.goto("/board");
  await expect(heading(old, "Sign in")).toBeVisible();

  await signIn(page, email, PASSWORD);
  await expect(page.getByRole("alert").filter({ hasText: "E-mail or password is wrong." })).toBeVisible();
  await signIn(page, email, "another password for tests");
  await expect(heading(page, "Board")).toBeVisible();

  await page.goto(link);
  await expect(heading(page, "This link no longer works")).toBeVisible();
  await old.context().close();
});

test("asking for a reset says the same where there is no account", async ({ page }) => {
  await page.goto("/reset");
  await page.getByLabel("E-mail").fill(`${randomUUID()}@nobody.example`);
  await page.getByRole("button", { name: "Send me a link" }).click();
  await expect(page.getByRole("status").filter({ hasText: "Check your mail" })).toBeVisible();
});

test("an invitation by mail makes a member with its role; taken out of the team, their open session ends at once", async ({
  page,
  browser,
}) => {
  const team = await freshTeam(browser);
  const invited = `${randomUUID()}@invited.example`;
  const head = await team.pageOf("head");
  await head.goto("/settings");
  await head.getByRole("button", { name: "Invite someone" }).click();
  const dialog = head.getByRole("dialog", { name: "Invite someone" });
  await dialog.getByLabel("E-mail").fill(invited);
  await dialog.getByLabel("Role").selectOption("medic");
  await dialog.getByRole("button", { name: "Send the invitation" }).click();
  await expect(dialog).toBeHidden();
  await expect(head.getByText("Medic, invited, until")).toBeVisible();

  const link = linkTo(await onlyMailTo(invited), "/invite/");
  await page.goto(link);
  await expect(heading(page, `Join ${team.name}`)).toBeVisible();
  await expect(page.getByLabel("E-mail")).toHaveValue(invited);
  await page.getByLabel("Your name").fill("Dr Halvard Osei");
  await page.getByLabel("Choose a password").fill("a few words in a row");
  await page.getByRole("button", { name: "Join the team" }).click();
  await expect(heading(page, "Board")).toBeVisible();
  await expect(page.getByRole("button", { name: /Dr Halvard Osei, medic/ })).toBeVisible();
  await page.goto(`/athletes/${team.athlete.id}`);
  await expect(page.getByRole("button", { name: "Set a hold" })).toBeVisible();

  const late = await browser.newContext();
  const again = await late.newPage();
  await again.goto(link);
  await expect(heading(again, "This invitation no longer works")).toBeVisible();
  await late.close();

  await head.reload();
  await head.getByRole("button", { name: "Take Dr Halvard Osei out of the team" }).click();
  await head.getByRole("button", { name: "Take Dr Halvard Osei out", exact: true }).click();
  await expect(head.getByText("Dr Halvard Osei is no longer in the team.").first()).toBeVisible();
  await expect(head.getByRole("listitem").filter({ hasText: invited })).toHaveCount(0);

  expect((await page.request.get("/api/camps")).status()).toBe(401);
  await page.reload();
  await expect(heading(page, "Sign in")).toBeVisible();
  await head.context().close();
});

test("a changed password keeps the one who changed it signed in and ends every other session", async ({
  browser,
}) => {
  const team = await freshTeam(browser);
  const [here, there] = [await team.pageOf("guest"), await team.pageOf("guest")];
  await here.goto("/settings");
  await here.getByLabel("Present password").fill(PASSWORD);
  await here.getByLabel("New password").fill("yet another password");
  await here.getByRole("button", { name: "Change the password" }).click();
  await expect(
    here.getByText("The password is changed. Everywhere else you are signed out.").first(),
  ).toBeVisible();
  await expect.poll(async () => (await here.request.get("/api/camps")).status()).toBe(200);
  expect((await there.request.get("/api/camps")).status()).toBe(401);
  await here.context().close();
  await there.context().close();
});
