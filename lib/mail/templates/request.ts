import { noteMail } from "../layout";
import { oneLine } from "../one-line";
import { mailSettings } from "../settings";

interface Asked {
  readonly athlete: string;
  readonly campId: string;
  /** "Hard sparring on Sat 5 Dec 11:00". */
  readonly session: string;
  readonly reason: string;
}

/** To those who may answer: an athlete cannot make a session. */
export const requestMail = ({ athlete, campId, session, reason }: Asked) => ({
  subject: `${oneLine(athlete)} can’t make ${oneLine(session)}`,
  ...noteMail({
    heading: `${oneLine(athlete)} can’t make ${oneLine(session)}`,
    paragraphs: [
      `In their words: ${oneLine(reason)}`,
      "Nothing has changed yet. On the camp page you see what moving or dropping the session does to the rest.",
    ],
    action: { label: "Open the camp", url: `${mailSettings().appUrl}/camps/${campId}` },
    footer: "You get this because you answer requests in this team.",
  }),
});

interface Answered {
  readonly session: string;
  readonly accepted: boolean;
  /** The coach's words; empty where there are none. */
  readonly answer: string;
  readonly by: string;
}

/** To the athlete: what the coach says. */
export const requestAnswerMail = ({ session, accepted, answer, by }: Answered) => {
  const what = accepted ? "You can leave it out" : "Your coach asks you to come";
  return {
    subject: `${what}: ${oneLine(session)}`,
    ...noteMail({
      heading: `${what}: ${oneLine(session)}`,
      paragraphs: [
        accepted
          ? `${oneLine(by)} accepted that you can’t make ${oneLine(session)}.`
          : `${oneLine(by)} declined: ${oneLine(session)} stands.`,
        ...(answer === "" ? [] : [`In their words: ${oneLine(answer)}`]),
      ],
      action: { label: "Open your day", url: `${mailSettings().appUrl}/today` },
      footer: "You get this because you asked about this session.",
    }),
  };
};
