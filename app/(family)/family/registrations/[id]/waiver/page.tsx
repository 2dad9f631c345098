import type { Metadata } from "next";
import { ActionForm } from "@/components/forms/action-form";
import { TextField } from "@/components/forms/text-field";
import { Tick } from "@/components/forms/tick";
import { WaiverReading } from "@/components/registrations/waiver-reading";
import { Caution } from "@/components/ui/caution";
import { PageHeading } from "@/components/ui/page-heading";
import { Verdict } from "@/components/ui/verdict";
import { showRegistration } from "@/lib/registrations/show-registration";
import { dayOf } from "@/lib/shared/dates";
import { showWaiver } from "@/lib/waivers/show-waiver";
import { ask } from "@/lib/web/ask";
import { pathTo } from "@/lib/web/paths";
import { signWaiverAction } from "../actions";

export const metadata: Metadata = { title: "Sign the waiver" };

type Props = { params: Promise<{ id: string }> };

export default async function WaiverSigningPage({ params }: Props) {
  const { id } = await params;
  const registration = await ask(showRegistration, { registrationId: id });
  const text = await ask(showWaiver, {});
  const { outing, child } = registration;
  return (
    <>
      <PageHeading
        title={text.title}
        crumbs={[{ href: "/family", text: "Your family" }, { href: pathTo.registration(id), text: outing.title }]}
        facts={`For ${child.nameUsed}, ${outing.title}, ${outing.dayInWords}. Text version ${text.version}.`}
      />
      <WaiverReading body={text.body} />
      <Caution>This text is to be reviewed by counsel in the programme&rsquo;s state. If you would like it read to you or explained, call us before you sign.</Caution>
      {registration.signed ? (
        <Verdict kind="good" sentence={registration.signed} />
      ) : (
        <section aria-labelledby="sign">
          <h2 id="sign">Sign</h2>
          <ActionForm action={signWaiverAction} submit="Sign" carry={{ registrationId: id, textSha256: text.sha256 }}>
            <Tick name="agree" label={`I am a legal guardian of ${child.nameUsed}, I have read the text above and I agree to it.`} />
            <TextField name="typedName" label="Your full name, as your signature" autoComplete="name" />
            <TextField name="typedDate" label="Today's date" isShort hint={`Year, month and day: ${dayOf(new Date().toISOString(), outing.zone)}.`} />
          </ActionForm>
        </section>
      )}
    </>
  );
}
