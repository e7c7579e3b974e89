import { firstLoadScript, openBrowser, signIn } from "./browser";

/** Limits in kB, compressed. */
const LIMITS = { "/": 220, "/camps/[id]": 260, "/sign-in": 150 } as const;

/** JavaScript of the first load per page, in kB as sent (compressed), beside its limit. */
export async function benchFirstLoad(url: string, campId: string) {
  const browser = await openBrowser();
  const context = await browser.newContext();
  await signIn(await context.newPage(), url, "head");
  const storage = JSON.stringify(await context.storageState());
  const kb = (bytes: number): number => Math.round(bytes / 100) / 10;
  const result = {
    "/": { kb: kb(await firstLoadScript(browser, `${url}/`)), limit: LIMITS["/"] },
    "/sign-in": { kb: kb(await firstLoadScript(browser, `${url}/sign-in`)), limit: LIMITS["/sign-in"] },
    "/camps/[id]": {
      kb: kb(await firstLoadScript(browser, `${url}/camps/${campId}`, storage)),
      limit: LIMITS["/camps/[id]"],
    },
  };
  await browser.close();
  return result;
}
