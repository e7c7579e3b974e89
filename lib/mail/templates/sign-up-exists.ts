import { noteMail } from "../layout";
import { mailSettings } from "../settings";

/** To the owner of an account whose e-mail someone gave at sign-up: the page itself did not say that there is one. */
export const signUpExistsMail = () => {
  const { appUrl } = mailSettings();
  return {
    subject: "You already have an account",
    ...noteMail({
      heading: "You already have an account",
      paragraphs: [
        "Someone, probably you, tried to sign up for Bellward with this e-mail address. There is an account for it already, so no new one was made.",
        `Sign in with the password you have. If you no longer know it, set a new one: ${appUrl}/reset`,
      ],
      action: { label: "Sign in", url: `${appUrl}/sign-in` },
      footer: "If it was not you, do nothing: nothing was changed, and they were not told.",
    }),
  };
};
