import type { Metadata } from "next";
import { ContactLines } from "@/components/registrations/contact-lines";
import { Caution } from "@/components/ui/caution";
import { PageHeading } from "@/components/ui/page-heading";
import { openContacts } from "@/lib/roster/open-contacts";
import { ask } from "@/lib/web/ask";
import { pathTo } from "@/lib/web/paths";

export const metadata: Metadata = { title: "Contacts and pick-up of your day" };

type Props = { params: Promise<{ slug: string }> };

export default async function FieldContactsPage({ params }: Props) {
  const { slug } = await params;
  const { outing, people } = await ask(openContacts, { slug });
  return (
    <>
      <PageHeading title="Contacts and pick-up" crumbs={[{ href: "/field", text: "The days you lead" }, { href: pathTo.fieldDay(slug), text: outing.title }]} facts="Each opening of this page is noted. It is not for paper." />
      <Caution>In an emergency call the local emergency number first. Hand people over only to somebody on their list, against photo identification.</Caution>
      <ContactLines people={people} />
    </>
  );
}
