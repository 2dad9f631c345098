import type { Metadata } from "next";
import { PageHeading } from "@/components/ui/page-heading";
import { showRegistration } from "@/lib/registrations/show-registration";
import { ask } from "@/lib/web/ask";
import { pathTo } from "@/lib/web/paths";
import { NeedsForm } from "./needs-form";

export const metadata: Metadata = { title: "What your child needs" };

type Props = { params: Promise<{ id: string }> };

export default async function NeedsPage({ params }: Props) {
  const { id } = await params;
  const { child, outing, guardianStays, thisTime } = await ask(showRegistration, { registrationId: id });
  return (
    <>
      <PageHeading
        title={`What ${child.nameUsed} needs`}
        crumbs={[{ href: "/family", text: "Your family" }, { href: pathTo.registration(id), text: outing.title }]}
        facts={child.profile ? "This is what you told us last time. Is it still right? Change what is not, and send it." : "You tell us once; next time you only say whether it is still right."}
      />
      <p className="mt-4">
        Share as much as you like. We use it to match guides, vehicles and formats, never to decide whether a child is welcome. You can change
        anything up to the morning of the outing, and we are glad to do this by phone.
      </p>
      <NeedsForm registrationId={id} nameUsed={child.nameUsed} profile={child.profile} guardianStays={guardianStays} thisTime={thisTime} />
    </>
  );
}
