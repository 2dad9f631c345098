import type { Metadata } from "next";
import { DeskRooms } from "@/components/outings/desk-rooms";
import { ContactLines } from "@/components/registrations/contact-lines";
import { PageHeading } from "@/components/ui/page-heading";
import { openContacts } from "@/lib/roster/open-contacts";
import { ask } from "@/lib/web/ask";
import { pathTo } from "@/lib/web/paths";

export const metadata: Metadata = { title: "Contacts and pick-up" };

type Props = { params: Promise<{ slug: string }> };

export default async function DeskContactsPage({ params }: Props) {
  const { slug } = await params;
  const { outing, people } = await ask(openContacts, { slug, at: "desk" });
  return (
    <>
      <PageHeading title="Contacts and pick-up" crumbs={[{ href: "/desk", text: "Desk" }, { href: pathTo.deskOuting(slug), text: outing.title }]} facts="Each opening of this page is noted. It is not for paper." />
      <DeskRooms slug={slug} here="Contacts" />
      <ContactLines people={people} />
    </>
  );
}
