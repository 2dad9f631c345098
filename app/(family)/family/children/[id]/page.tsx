import type { Metadata } from "next";
import { PageHeading } from "@/components/ui/page-heading";
import { showChild } from "@/lib/families/show-child";
import { plainDayInWords } from "@/lib/shared/dates";
import { ask } from "@/lib/web/ask";
import { ProfileForm } from "./profile-form";

export const metadata: Metadata = { title: "A child's access profile" };

type Props = { params: Promise<{ id: string }> };

export default async function ChildPage({ params }: Props) {
  const { id } = await params;
  const child = await ask(showChild, { participantId: id });
  return (
    <>
      <PageHeading title={child.nameUsed} crumbs={[{ href: "/family", text: "Your family" }]} facts={`Born ${plainDayInWords(child.birthDate)}.`} />
      <p className="mt-4">
        Tell us what makes a good day outdoors. Share as much as you like. We use it to match guides, vehicles and formats, never to decide
        whether a child is welcome. Beside each part you can read who will see the answer. You can change anything up to the morning of the
        outing.
      </p>
      <ProfileForm participantId={child.id} nameUsed={child.nameUsed} profile={child.profile?.answers ?? null} />
    </>
  );
}
