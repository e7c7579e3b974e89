import type { Metadata } from "next";
import type { ReactNode } from "react";
import { HouseRuleList } from "@/components/start/house-rule-list";
import { LinkButton } from "@/components/ui/link-button";

export const metadata: Metadata = { title: "How it plans" };

const Part = ({ title, children }: { readonly title: string; readonly children: ReactNode }) => (
  <section>
    <h2 className="mb-1.5 text-xl font-semibold">{title}</h2>
    <div className="grid max-w-prose gap-2.5">{children}</div>
  </section>
);

/** What the planner does and on whose word, for a coach who wants to know before trusting it. */
export default function HowPage() {
  return (
    <article className="pt-4">
      <h1 className="mb-6 text-2xl font-semibold">How it plans</h1>
      <div className="mb-9 grid gap-x-14 gap-y-8 lg:grid-cols-2">
        <Part title="It counts back from the bell">
          <p>
            Camp weeks end with the bout, not with Sunday. The last 7 to 14 days are taper: two weeks in a
            camp of six weeks or more, less in a shorter one. Before it comes power, before that strength, and
            in a long camp a foundation first. A short-notice camp loses its front, never its taper.
          </p>
        </Part>
        <Part title="It places lifting where the sport leaves room">
          <p>
            Sparring, pads and drills stand where your gym put them. Every lift of the week is tried at every
            start that the athlete’s free hours allow. Some rules forbid: heavy legs end at least 24 h before
            hard rounds, and no heavy legs in fight week. Others cost: six hours to other training, the
            freshest day for the most important lift, a day off each week. The plan shown is the cheapest of
            all that are allowed, found exactly and not by trial. What has no room is left out and said so.
          </p>
        </Part>
        <Part title="It doses by what is near">
          <p>
            Each session starts from a number of working sets and multiplies: the wave over a block, the
            taper, hard sparring before and after, a cap on how fast a week’s load may rise. Every factor is
            shown with the session.
          </p>
          <p>
            In the taper the sets fall by about half on average while load on the bar and days a week stay,
            because that is what the pooled studies support (Bosquet et al. 2007, 27 studies of competitive
            athletes). It pools several sports and says nothing of fighters in particular; read it as the best
            there is.
          </p>
        </Part>
        <Part title="It adds up load and does not guess form">
          <p>
            Load is session effort from 0 to 10 times minutes (Foster 1998; Foster et al. 2001). The form
            curve on a camp’s page follows the two-component model of Banister with constants from the
            literature; its authors’ successors found wide margins (Hellard et al. 2006). It is an
            illustration of training theory, not a forecast, and there is no readiness number anywhere.
          </p>
        </Part>
        <Part title="Every threshold is a house rule">
          <p>
            A team may change each of them within its range. Where no study gives a number the rule says so:
            “common practice” means that coaches do it, not that it was tested. “From memory” means that the
            number has not yet been read in the source itself.
          </p>
        </Part>
      </div>
      <HouseRuleList />
      <div className="mt-8">
        <LinkButton href="/" variant="primary">
          Lay out a camp
        </LinkButton>
      </div>
    </article>
  );
}
