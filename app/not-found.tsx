import type { Metadata } from "next";
import Link from "next/link";
import { PageHeading } from "@/components/ui/page-heading";

export const metadata: Metadata = { title: "Not found" };

export default function NotFound() {
  return (
    <>
      <PageHeading title="We could not find that page" />
      <p>It may have moved, or this account may not open it. Nothing you typed elsewhere is lost.</p>
      <p className="mt-4">
        <Link href="/outings">See the next outings</Link>
      </p>
    </>
  );
}
