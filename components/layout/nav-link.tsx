"use client";

import type { Route } from "next";
import Link from "next/link";
import { usePathname } from "next/navigation";

/** A link of the header that says when its page is the one being read. */
export function NavLink({ href, text }: { href: Route; text: string }) {
  const path = usePathname();
  const isHere = path === href || (href !== "/desk" && path.startsWith(`${href}/`)) || (href === "/desk" && path.startsWith("/desk/outings"));
  return (
    <Link
      href={href}
      prefetch={false}
      aria-current={isHere ? "page" : undefined}
      className={`inline-block text-ink font-semibold py-2.5 ${isHere ? "underline decoration-marsh decoration-4" : "no-underline hover:underline"}`}
    >
      {text}
    </Link>
  );
}
