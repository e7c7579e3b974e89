import { expect, test, type Page } from "@playwright/test";
import ICAL from "ical.js";
import { dateAhead, freshCamp, freshTeam, saveMove } from "./team-scene";

interface FeedEvent {
  readonly uid: string;
  readonly summary: string;
  readonly sequence: number;
  readonly start: string;
}

/** The events of a calendar as ical.js reads them. */
function eventsIn(body: string): FeedEvent[] {
  const calendar = new ICAL.Component(ICAL.parse(body));
  expect(calendar.name).toBe("vcalendar");
  return calendar.getAllSubcomponents("vevent").map((component) => {
    const event = new ICAL.Event(component);
    return {
      uid: event.uid,
      summary: event.summary,
      sequence: Number(component.getFirstPropertyValue("sequence")),
      start: event.startDate.toJSDate().toISOString(),
    };
  });
}

function eventOf(body: string, summary: string): FeedEvent {
  const [event, another] = eventsIn(body).filter((candidate) => candidate.summary.includes(summary));
  if (!event || another) throw new Error(`Not one event is called ${summary}.`);
  return event;
}

/** Subscribes on the settings page and gives back the address that it shows. */
async function subscribe(page: Page): Promise<string> {
  await page.goto("/settings");
  await page.getByRole("button", { name: "Subscribe" }).click();
  await page.getByRole("button", { name: "Make the address" }).click();
  const dialog = page.getByRole("dialog", { name: "Add it to your calendar" });
  await expect(dialog.getByRole("img", { name: "QR code of the calendar's address" })).toBeVisible();
  const address = await dialog.getByLabel(/^https? address$/).inputValue();
  await expect(dialog.getByRole("link", { name: "Open in the calendar" })).toHaveAttribute(
    "href",
    address.replace(/^https?:/, "webcal:"),
  );
  await expect(dialog.getByRole("link", { name: "Download once" })).toHaveAttribute("href", address);
  await dialog.getByRole("button", { name: "Done" }).click();
  return address;
}

test("an athlete's calendar follows a move of the head coach, and ends when the athlete ends it", async ({
  browser,
  request,
}) => {
  const team = await freshTeam(browser);
  const head = await team.pageOf("head");
  await head.goto("/board");
  const campId = await freshCamp(head.context(), team.athlete.id);
  const athlete = await team.pageOf("athlete");
  const address = await subscribe(athlete);
  // Shown once: the page does not know it any more.
  await athlete.reload();
  await expect(athlete.getByText("Your camp")).toBeVisible();
  expect(await athlete.content()).not.toContain(new URL(address).pathname);

  // As a calendar does: no cookie, nothing but the address.
  const before = await request.get(address);
  expect(before.status()).toBe(200);
  expect(before.headers()["content-type"]).toContain("text/calendar");
  expect(before.headers()["cache-control"]).toContain("private");
  const etag = before.headers().etag ?? "";
  expect(etag).toMatch(/^"/);
  const body = await before.text();
  const old = eventOf(body, "Sparring of next week");
  expect(old.start).toContain(dateAhead(9));
  expect(eventsIn(body).some((event) => /bout/i.test(event.summary))).toBe(true);

  const unchanged = await request.get(address, { headers: { "if-none-match": etag } });
  expect(unchanged.status()).toBe(304);
  expect(unchanged.headers().etag).toBe(etag);
  expect((await unchanged.body()).length).toBe(0);
  const asked = await request.head(address);
  expect([asked.status(), asked.headers().etag]).toEqual([200, etag]);

  await saveMove(head, campId, "Sparring of next week", { date: dateAhead(11), start: "19:00" });

  const after = await request.get(address, { headers: { "if-none-match": etag } });
  expect(after.status()).toBe(200);
  expect(after.headers().etag).not.toBe(etag);
  const moved = eventOf(await after.text(), "Sparring of next week");
  expect(moved.uid).toBe(old.uid);
  expect(moved.sequence).toBeGreaterThan(old.sequence);
  expect(moved.start).toContain(dateAhead(11));
  const again = await request.get(address, { headers: { "if-none-match": after.headers().etag ?? "" } });
  expect(again.status()).toBe(304);

  await athlete.getByRole("button", { name: "End the subscription: Your camp" }).click();
  await athlete.getByRole("button", { name: "End the subscription", exact: true }).click();
  await expect(athlete.getByText("No subscription yet")).toBeVisible();
  expect((await request.get(address)).status()).toBe(404);
  expect((await request.get(address, { headers: { "if-none-match": etag } })).status()).toBe(404);
  await head.context().close();
  await athlete.context().close();
});

test("a renewed address takes the place of the old one; a discreet calendar says nothing of content", async ({
  browser,
  request,
}) => {
  const team = await freshTeam(browser);
  const page = await team.pageOf("head");
  await page.goto("/board");
  await freshCamp(page.context(), team.athlete.id);
  await page.goto("/settings");
  await page.getByRole("button", { name: "Subscribe" }).click();
  await page.getByLabel("One athlete").check();
  await page.getByLabel("Athlete", { exact: true }).selectOption({ label: team.athlete.name });
  await page.getByLabel("Discreet").check();
  await page.getByRole("button", { name: "Make the address" }).click();
  const field = page.getByRole("dialog").getByLabel(/^https? address$/);
  const old = await field.inputValue();
  await page.getByRole("button", { name: "Done" }).click();
  const discreet = await (await request.get(old)).text();
  expect(new Set(eventsIn(discreet).map((event) => event.summary))).toEqual(
    new Set(["Training", "Sport", "Appointment", "Bout"]),
  );
  for (const told of [team.athlete.name, team.name, "Sparring", "Petra", "Ellery Hall", "sets"])
    expect(discreet).not.toContain(told);

  await page.getByRole("button", { name: `Renew the address: ${team.athlete.name}` }).click();
  await page.getByRole("button", { name: "Renew the address", exact: true }).click();
  await expect(field).not.toHaveValue(old);
  const renewed = await field.inputValue();
  expect((await request.get(old)).status()).toBe(404);
  expect((await request.get(renewed)).status()).toBe(200);
  await page.context().close();
});
