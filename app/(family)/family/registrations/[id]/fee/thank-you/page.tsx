import type { Metadata } from "next";
import Link from "next/link";
import { ActionForm } from "@/components/forms/action-form";
import { PageHeading } from "@/components/ui/page-heading";
import { Verdict } from "@/components/ui/verdict";
import { showRegistration } from "@/lib/registrations/show-registration";
import { ask } from "@/lib/web/ask";
import { pathTo } from "@/lib/web/paths";
import { askAboutPaymentAction } from "../../actions";

export const metadata: Metadata = { title: "Back from the payment page" };

type Props = { params: Promise<{ id: string }> };

/** Coming back here changes nothing: only the payment service's own word settles a payment. */
export default async function ThankYouPage({ params }: Props) {
  const { id } = await params;
  const registration = await ask(showRegistration, { registrationId: id });
  const { outing, child, fee } = registration;
  return (
    <>
      <PageHeading
        title="Back from the payment page"
        crumbs={[{ href: "/family", text: "Your family" }, { href: pathTo.registration(id), text: outing.title }]}
      />
      {fee.state === "settled" ? (
        <Verdict kind="good" sentence={`${fee.amount} has arrived. Thank you.`}>
          <p>{registration.stateInWords}</p>
        </Verdict>
      ) : (
        <>
          <Verdict kind="wait" sentence="We are waiting for the payment service to tell us about the payment.">
            {fee.checkoutUrl && (
              <p>
                Not paid yet? <a href={fee.checkoutUrl}>Go back to the payment page</a>
              </p>
            )}
            <p>This takes a few seconds as a rule. {child.nameUsed}&rsquo;s seat stays held. You may leave this page: we write to you as soon as it is settled.</p>
          </Verdict>
          <ActionForm action={askAboutPaymentAction} submit="Ask the payment service now" look="second" carry={{ registrationId: id }} />
        </>
      )}
      <p className="mt-6">
        <Link href={pathTo.registration(id)} className="button">
          Back to the registration
        </Link>
      </p>
    </>
  );
}
