import { Bars, ChevronDown } from "@/components/ui/icons";
import { PageLink } from "@/components/ui/page-link";
import type { NavItem } from "./nav";
import { NavLinks } from "./nav-links";
import { NavPageLinks } from "./nav-page-links";
import { SignOutButton } from "./sign-out-button";
import { Wordmark } from "./wordmark";

export interface TopBarProps {
  readonly nav: readonly NavItem[];
  readonly team: string;
  readonly person: string;
  /** "head coach" */
  readonly role: string;
  /** Links load their page whole: for the phone in a basement, where the router could not fetch parts of one. */
  readonly whole?: boolean;
}

// Menus are the browser's own popovers: they close on Escape and outside presses and give focus back without script.
const MENU = "bg-bar text-bar-text on-bar border-bar-line absolute inset-auto top-[52px] m-0 border";

function AccountMenu({ team, person, role, whole }: Omit<TopBarProps, "nav">) {
  const Links = whole ? NavPageLinks : NavLinks;
  return (
    <div id="account-menu" popover="auto" className={`${MENU} right-4 w-64 rounded-b py-2 md:right-7`}>
      <p className="px-6 py-2 text-sm">
        <span className="block font-semibold">{person}</span>
        <span className="block text-xs text-bar-quiet">
          {role}, {team}
        </span>
      </p>
      <Links place="menu" items={[{ href: "/settings", label: "Settings" }]} />
      <SignOutButton className="w-full justify-start! px-6! text-bar-quiet! hover:bg-bar-line! hover:text-bar-text!" />
    </div>
  );
}

/** The dark bar over every page of a team. */
export function TopBar({ nav, team, person, role, whole = false }: TopBarProps) {
  const Links = whole ? NavPageLinks : NavLinks;
  return (
    <header className="on-bar bg-bar text-bar-text print:hidden">
      <div className="mx-auto flex h-[52px] max-w-page items-center gap-4 px-4 md:gap-7 md:px-7">
        <button
          type="button"
          popoverTarget="site-menu"
          aria-label="Pages"
          className="-ml-2 flex size-11 items-center justify-center rounded lg:hidden"
        >
          <Bars />
        </button>
        <PageLink
          href={nav[0]?.href ?? "/settings"}
          aria-label="Bellward, first page"
          className="flex min-h-11 items-center rounded"
        >
          <Wordmark onBar />
        </PageLink>
        <nav aria-label="Main" className="hidden gap-5 text-sm lg:flex">
          <Links items={nav} place="bar" />
        </nav>
        <button
          type="button"
          popoverTarget="account-menu"
          className="ml-auto flex min-h-11 min-w-0 items-center gap-2 rounded text-sm text-bar-quiet hover:text-bar-text"
        >
          <span className="hidden truncate sm:block">
            {team} · {person}, {role}
          </span>
          <span className="sm:hidden">You</span>
          <ChevronDown className="shrink-0" />
        </button>
      </div>
      <nav
        id="site-menu"
        popover="auto"
        aria-label="Main, menu"
        className={`${MENU} inset-x-0 w-full border-x-0 py-2`}
      >
        <Links items={nav} place="menu" />
      </nav>
      <AccountMenu team={team} person={person} role={role} whole={whole} />
    </header>
  );
}
