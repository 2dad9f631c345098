import type { Route } from "next";
import Link from "next/link";
import type { ReactNode } from "react";

type Crumb = { href: Route; text: string };

/** Where this page belongs, its name, and the one line that says what it is about. */
export function PageHeading({ title, crumbs = [], facts }: { title: string; crumbs?: Crumb[]; facts?: ReactNode }) {
  return (
    <div className="pt-8 pb-2">
      {crumbs.length > 0 && (
        <nav aria-label="Where you are">
          <ol className="flex flex-wrap gap-x-2 mb-1">
            {crumbs.map((crumb, index) => (
              <li key={crumb.href}>
                {index > 0 && <span aria-hidden="true">/ </span>}
                <Link href={crumb.href} prefetch={false} className="inline-block py-1">
                  {crumb.text}
                </Link>
              </li>
            ))}
          </ol>
        </nav>
      )}
      <h1>{title}</h1>
      {facts && <p className="text-quiet mt-3">{facts}</p>}
    </div>
  );
}
