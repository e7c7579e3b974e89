import { noteMail } from "../layout";
import { mailSettings } from "../settings";

/** Tells the owner after the fact, so that a password that someone else changed does not go unseen. */
export const passwordChangedMail = () => {
  const { appUrl } = mailSettings();
  return {
    subject: "Your password was changed",
    ...noteMail({
      heading: "Your password was changed",
      paragraphs: [
        "The password of your Bellward account was changed, and everyone who was signed in with it was signed out.",
      ],
      action: { label: "It was not me: set a new one", url: `${appUrl}/reset` },
      footer: "If you changed it yourself, there is nothing to do.",
    }),
  };
};
