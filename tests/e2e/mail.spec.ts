import { expect, test } from "@playwright/test";
import { headerOf, linkTo, mailsTo, onlyMailTo } from "./caught-mail";
import { dateAhead, freshCamp, freshTeam, saveMove } from "./team-scene";

/** A team whose head coach has just moved tomorrow's sparring, and how many people that told. */
async function movedTomorrow(browser: Parameters<typeof freshTeam>[0]) {
  const team = await freshTeam(browser);
  const head = await team.pageOf("head");
  await head.goto("/board");
  const campId = await freshCamp(head.context(), team.athlete.id);
  const answer = await saveMove(head, campId, "Sparring of tomorrow", { date: dateAhead(2), start: "12:30" });
  return { ...team, head, campId, told: answer.told };
}

test("a change within 48 h is mailed at once to the people concerned, not to the one who saved it", async ({
  browser,
}) => {
  const { email, head, told, athlete } = await movedTomorrow(browser);
  expect(told).toBe(3);
  // The text names both times and who saved it; collected mail would come two minutes later.
  for (const role of ["athlete", "strength", "skills"] as const) {
    const mail = await onlyMailTo(email(role));
    expect(mail.subject).toContain(role === "athlete" ? "Your camp" : "Fighter's camp");
    expect(mail.text).toContain("Sparring of tomorrow");
    expect(mail.text).toContain("18:00");
    expect(mail.text).toContain("12:30");
    expect(mail.text).toContain("Saved by head of");
    expect(mail.html).toContain("Sparring of tomorrow");
    expect(headerOf(mail, "Auto-Submitted")).toBe("auto-generated");
    expect(headerOf(mail, "List-Unsubscribe-Post")).toBe("List-Unsubscribe=One-Click");
  }
  expect(await mailsTo(email("head"))).toEqual([]);
  expect(await mailsTo(email("medic"))).toEqual([]);
  expect(await mailsTo(email("guest"))).toEqual([]);
  expect(athlete.name).toMatch(/^Fighter /);
  await head.context().close();
});

test("the link in the mail opens the session, through the sign-in where nobody is signed in", async ({
  browser,
}) => {
  const { email, head, campId, pageOf } = await movedTomorrow(browser);
  const mail = await onlyMailTo(email("athlete"));
  const link = mail.text.split("\n").flatMap((line, index, lines) => {
    const at =
      line === "Sparring of tomorrow" ? lines.slice(index + 1).find((next) => next.includes("http")) : null;
    return at ? [at.trim()] : [];
  })[0];
  expect(link).toContain(`/camps/${campId}`);

  const athlete = await pageOf("athlete");
  await athlete.goto(link ?? "");
  const details = athlete.getByRole("article", { name: "Sparring of tomorrow" });
  await expect(details).toBeVisible();
  await expect(details).toContainText("12:30");
  await athlete.context().close();

  const stranger = await browser.newContext();
  const page = await stranger.newPage();
  await page.goto(link ?? "");
  await page.getByLabel("E-mail").fill(email("strength"));
  await page.getByLabel("Password", { exact: true }).fill("a password for tests");
  await page.getByRole("button", { name: "Sign in" }).click();
  await expect(page.getByRole("article", { name: "Sparring of tomorrow" })).toBeVisible();
  await stranger.close();
  await head.context().close();
});

test("opening the unsubscribe page stops nothing; its button does", async ({ browser, page }) => {
  const { email, head, pageOf } = await movedTomorrow(browser);
  const link = linkTo(await onlyMailTo(email("athlete")), "/unsubscribe/");
  const athlete = await pageOf("athlete");
  const choice = async (): Promise<unknown> =>
    ((await (await athlete.request.get("/api/account")).json()) as { mailChoice: string }).mailChoice;

  await page.goto(link);
  const stop = page.getByRole("button", { name: "Stop these mails" });
  await expect(stop).toBeVisible();
  expect(await choice()).toBe("each");
  await stop.click();
  await expect(page.getByRole("heading", { name: "No more mail about changes" })).toBeVisible();
  expect(await choice()).toBe("none");

  await athlete.goto("/settings");
  await expect(athlete.getByLabel("Never")).toBeChecked();
  await athlete.context().close();
  await head.context().close();
});

test("one click of a mail program (RFC 8058) stops mail: a POST without cookies; a GET there does nothing", async ({
  browser,
  request,
}) => {
  const { email, head, campId, pageOf } = await movedTomorrow(browser);
  const header = headerOf(await onlyMailTo(email("skills")), "List-Unsubscribe") ?? "";
  const url = /^<(.+)>$/.exec(header)?.[1] ?? "";
  const skills = await pageOf("skills");
  const choice = async (): Promise<unknown> =>
    ((await (await skills.request.get("/api/account")).json()) as { mailChoice: string }).mailChoice;

  expect((await request.get(url)).ok()).toBe(false);
  expect((await request.post(url, { form: { something: "else" } })).status()).toBe(400);
  expect(await choice()).toBe("each");
  const clicked = await request.post(url, { form: { "List-Unsubscribe": "One-Click" } });
  expect(clicked.status()).toBe(200);
  expect(await choice()).toBe("none");

  // The next save reaches the others and not them.
  await saveMove(head, campId, "Sparring of tomorrow", { date: dateAhead(1), start: "17:30" });
  await expect.poll(async () => (await mailsTo(email("strength"))).length, { timeout: 60_000 }).toBe(2);
  expect(await mailsTo(email("skills"))).toHaveLength(1);
  await skills.context().close();
  await head.context().close();
});

test("the outbox of the development server shows the mail with its links", async ({ browser, page }) => {
  const { email, head } = await movedTomorrow(browser);
  const mail = await onlyMailTo(email("athlete"));
  await page.goto("/outbox");
  const entry = page
    .getByRole("navigation", { name: "Caught mails" })
    .getByRole("link")
    .filter({
      hasText: email("athlete"),
    });
  await entry.click();
  await expect(page.getByRole("article", { name: mail.subject })).toBeVisible();
  await expect(page.locator("pre")).toContainText("Sparring of tomorrow");
  await expect(
    page
      .frameLocator(`iframe[title="Mail: ${mail.subject}"]`)
      .getByRole("link", { name: "Sparring of tomorrow" }),
  ).toBeVisible();
  const unsubscribe = linkTo(mail, "/unsubscribe/");
  await page.getByRole("link", { name: unsubscribe }).click();
  await expect(page.getByRole("heading", { level: 1, name: "Stop mail about changes?" })).toBeVisible();
  await head.context().close();
});
