import { oneLine } from "../one-line";
import { mailSettings } from "../settings";
import { noteMail } from "../layout";

interface Knock {
  readonly athlete: string;
  readonly athleteId: string;
  /** "Hard sparring on Sat 5 Dec". */
  readonly session: string;
  /** First day of the hold, "Sun 6 Dec"; null where an open-ended one stood already. */
  readonly heldFrom: string | null;
  /** What the athlete said: for the medic alone, null for everyone else. */
  readonly said: readonly string[] | null;
}

/** Told at once after a knock to the head was reported. Whatever was said about it goes to the medic and to nobody else. */
export const knockMail = ({ athlete, athleteId, session, heldFrom, said }: Knock) => {
  const name = oneLine(athlete);
  return {
    subject: `${name} reported a knock to the head`,
    ...noteMail({
      heading: `${name} reported a knock to the head`,
      paragraphs: [
        `${name} reported a knock to the head in ${oneLine(session)}.`,
        heldFrom === null
          ? "A hold without an end stands already: nothing is planned until the medic lifts it."
          : `A hold stands from ${heldFrom}: nothing is planned from then on until the medic lifts it.`,
        ...(said ?? []).map(oneLine),
        said === null
          ? "Whatever was said about it went to the medic alone."
          : "Only the medic lifts the hold. This mail is no medical judgement.",
      ],
      action: { label: "Open the athlete", url: `${mailSettings().appUrl}/athletes/${athleteId}` },
      footer: "You get this at once, whatever your mail choice is, because of your role in the team.",
    }),
  };
};
