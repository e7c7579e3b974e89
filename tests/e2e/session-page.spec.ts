import { expect, test, type Page } from "@playwright/test";
import type { SessionPageView } from "@/lib/schemas/prescription";
import { makeCamp, readCamp, signInAs } from "./camp-scene";

/** Opens the first Strength A of a camp of its own; nothing in it is past. */
async function openLift(page: Page, name: string): Promise<SessionPageView> {
  const { request } = page.context();
  const camp = await makeCamp(request, name);
  const { plan } = await readCamp(request, camp.id);
  const lift = plan.lifts.find(({ item }) => item === "strength-a");
  if (!lift) throw new Error("There is no Strength A.");
  const path = `/camps/${camp.id}/sessions/${encodeURIComponent(lift.id)}`;
  const view = (await (await request.get(`/api${path}`)).json()) as SessionPageView;
  await page.goto(path);
  await expect(page.getByRole("heading", { level: 1, name: "Strength A" })).toBeVisible();
  return view;
}

test.beforeEach(async ({ context }) => {
  await signInAs(context, "head");
});

test("a coach's edit stands beside what was planned, and goes back by the message and by the line", async ({
  page,
}) => {
  const { lift } = await openLift(page, "Edits");
  const line = lift?.lines[0];
  if (!line) throw new Error("There is no line.");
  const sets = line.sets === 4 ? 3 : 4;
  const edit = async () => {
    await page.getByRole("button", { name: `Edit ${line.name}`, exact: true }).click();
    const form = page.getByRole("form", { name: `Edit ${line.name}`, exact: true });
    await form.getByLabel("Sets").fill(String(sets));
    await form.getByLabel("Note").fill("Stop two short.");
    await form.getByRole("button", { name: "Save the line" }).click();
    await expect(page.getByText(`Coach: ${sets} sets, was ${line.sets}`)).toBeVisible();
    await expect(page.getByText("Coach’s note: Stop two short.")).toBeVisible();
  };
  await edit();
  await page.getByRole("status").getByRole("button", { name: "Put back" }).click();
  await expect(page.getByText("Coach’s note: Stop two short.")).toHaveCount(0);
  await edit();
  await page.reload();
  await page.getByRole("button", { name: "Put this line back" }).click();
  await expect(page.getByText("Coach’s note: Stop two short.")).toHaveCount(0);
});

test("a swap says for how many sessions it holds, and is put back", async ({ page }) => {
  const { lift } = await openLift(page, "Swaps");
  const line = lift?.lines.find(({ swaps }) => swaps.length > 0);
  const to = line?.swaps[0];
  if (!lift || !line || to === undefined) throw new Error("There is nothing to swap.");
  const name = lift.names[to] ?? to;
  await page.getByRole("button", { name: `Swap ${line.name}`, exact: true }).click();
  await page.getByRole("button", { name: "Swap for all Strength A of this camp" }).click();
  await expect(page.getByText(`Instead of ${line.name} in all Strength A of this camp.`)).toBeVisible();
  await expect(page.getByRole("heading", { level: 3, name })).toBeVisible();
  await page.getByRole("button", { name: `Put ${line.name} back`, exact: true }).click();
  await expect(page.getByRole("heading", { level: 3, name: line.name })).toBeVisible();
});

test("sessions lead to the next one, to the camp and to the week's sheet", async ({ page }) => {
  const view = await openLift(page, "Ways");
  await page.getByRole("link", { name: /^After: / }).click();
  await expect(page.getByRole("heading", { level: 1, name: view.next?.title ?? "" })).toBeVisible();
  await page.getByRole("link", { name: /^Before: / }).click();
  await expect(page.getByRole("heading", { level: 1, name: "Strength A" })).toBeVisible();
  await page.getByRole("link", { name: "The week’s sheet" }).click();
  await expect(page.getByRole("article")).toContainText("Strength A");
  await page.goBack();
  await page.getByRole("link", { name: "To the camp" }).click();
  await page.getByRole("link", { name: "Open the session" }).click();
  await expect(page.getByText("What is asked")).toBeVisible();
});
