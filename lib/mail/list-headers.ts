import { mailSettings } from "./settings";
import { unsubscribeToken } from "./unsubscribe";

/** The address that ends mail about changes: a page for people, one click for mail programs. */
export const unsubscribeUrls = (userId: string) => {
  const { appUrl } = mailSettings();
  const token = unsubscribeToken(userId);
  return { page: `${appUrl}/unsubscribe/${token}`, oneClick: `${appUrl}/api/unsubscribe/${token}` };
};

/** Headers of mail that a person can stop: RFC 2919 (List-Id), RFC 2369 and RFC 8058 (List-Unsubscribe). */
export const listHeaders = (userId: string): Record<string, string> => ({
  "List-Id": `Bellward changes <changes.bellward.${mailSettings().domain}>`,
  "List-Unsubscribe": `<${unsubscribeUrls(userId).oneClick}>`,
  "List-Unsubscribe-Post": "List-Unsubscribe=One-Click",
});
