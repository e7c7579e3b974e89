import { noteMail } from "../layout";
import { mailSettings } from "../settings";

/** Minutes that a reset link can be used. */
export const RESET_MINUTES = 30;

/** The mail with the link that sets a new password, once. */
export const resetMail = (token: string) => ({
  subject: "Set a new password",
  ...noteMail({
    heading: "Set a new password",
    paragraphs: [
      `Someone, probably you, asked for a new password for Bellward. The link works once, for ${RESET_MINUTES} minutes.`,
      "Setting it signs you out everywhere else.",
    ],
    action: { label: "Set a new password", url: `${mailSettings().appUrl}/reset/${token}` },
    footer: "If it was not you, do nothing: your password stays as it is.",
  }),
});
