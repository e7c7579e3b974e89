import { firstLoadScript, openBrowser, signIn } from "./browser";

/** Limits in kB, compressed. */
const LIMITS = { "/": 220, "/camps/[id]": 260, "/sign-in": 150, "/today": 170 } as const;

/** JavaScript of the first load per page, in kB as sent (compressed), beside its limit. */
export async function benchFirstLoad(url: string, campId: string) {
  const browser = await openBrowser();
  const sessionOf = async (role: string): Promise<string> => {
    const context = await browser.newContext();
    await signIn(await context.newPage(), url, role);
    return JSON.stringify(await context.storageState());
  };
  const [head, athlete] = [await sessionOf("head"), await sessionOf("athlete")];
  const kb = (bytes: number): number => Math.round(bytes / 100) / 10;
  const result = {
    "/": { kb: kb(await firstLoadScript(browser, `${url}/`)), limit: LIMITS["/"] },
    "/sign-in": { kb: kb(await firstLoadScript(browser, `${url}/sign-in`)), limit: LIMITS["/sign-in"] },
    "/camps/[id]": {
      kb: kb(await firstLoadScript(browser, `${url}/camps/${campId}`, head)),
      limit: LIMITS["/camps/[id]"],
    },
    "/today": { kb: kb(await firstLoadScript(browser, `${url}/today`, athlete)), limit: LIMITS["/today"] },
  };
  await browser.close();
  return result;
}
