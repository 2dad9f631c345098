import type { Metadata } from "next";
import { printRosterAction } from "@/app/print-roster-action";
import { DeskRooms } from "@/components/outings/desk-rooms";
import { RosterPapers } from "@/components/outings/roster-papers";
import { PageHeading } from "@/components/ui/page-heading";
import { listPapers } from "@/lib/roster/list-papers";
import { ask } from "@/lib/web/ask";
import { pathTo } from "@/lib/web/paths";

export const metadata: Metadata = { title: "Papers" };

type Props = { params: Promise<{ slug: string }> };

export default async function PapersPage({ params }: Props) {
  const { slug } = await params;
  const { outing, papers, isCurrent } = await ask(listPapers, { slug });
  return (
    <>
      <PageHeading title="Papers" crumbs={[{ href: "/desk", text: "Desk" }, { href: pathTo.deskOuting(slug), text: outing.title }]} facts={outing.when} />
      <DeskRooms slug={slug} here="Papers" />
      <RosterPapers slug={slug} papers={papers} isCurrent={isCurrent} sizePt={18} print={printRosterAction} />
    </>
  );
}
