import type { Route } from "next";
import Link from "next/link";
import { hasRole, isSignedIn, isStaff, type Actor } from "@/lib/shared/actor";
import { Mark } from "./mark";
import { NavLink } from "./nav-link";

/** Which doors somebody has; the doors themselves decide who may pass. */
function doorsFor(actor: Actor): { href: Route; text: string }[] {
  const doors: { href: Route; text: string }[] = [];
  if (isStaff(actor)) doors.push({ href: "/desk", text: "Desk" }, { href: "/desk/people", text: "People" }, { href: "/desk/sites", text: "Sites" });
  doors.push({ href: "/outings", text: "Outings" }, { href: "/models", text: "Teaching models" });
  if (hasRole(actor, "guardian")) doors.push({ href: "/family", text: "Family" });
  if (hasRole(actor, "chaperone", "leader")) doors.push({ href: "/helping", text: "Helping" });
  if (hasRole(actor, "leader")) doors.push({ href: "/field", text: "My days" });
  return doors;
}

export function SiteHeader({ actor }: { actor: Actor }) {
  return (
    <header className="top border-b-2 border-edge">
      <div className="frame flex flex-wrap items-center gap-x-8 gap-y-1 py-3">
        <Link href="/" prefetch={false} className="flex items-center gap-2.5 font-extrabold text-[1.35rem] text-ink no-underline py-1">
          <Mark />
          Dunlin
        </Link>
        <nav aria-label="Main">
          <ul className="flex flex-wrap gap-x-6">
            {doorsFor(actor).map((door) => (
              <li key={door.href}>
                <NavLink {...door} />
              </li>
            ))}
          </ul>
        </nav>
        <nav aria-label="You" className="mid:ml-auto">
          <ul className="flex flex-wrap gap-x-6">
            <li>
              <NavLink href="/look" text="Text size and colours" />
            </li>
            <li>{isSignedIn(actor) ? <NavLink href="/account" text={actor.name} /> : <NavLink href="/sign-in" text="Sign in" />}</li>
          </ul>
        </nav>
      </div>
    </header>
  );
}
