import type { Metadata } from "next";
import { ActionForm } from "@/components/forms/action-form";
import { DeliveryTable } from "@/components/ui/delivery-table";
import { PageHeading } from "@/components/ui/page-heading";
import { listDeliveries } from "@/lib/messages/list-deliveries";
import { env } from "@/lib/shared/env";
import { ask } from "@/lib/web/ask";
import { retryDeliveriesAction } from "./actions";

export const metadata: Metadata = { title: "Messages" };

export default async function MessagesPage() {
  const { deliveries, unsent } = await ask(listDeliveries, {});
  const open = unsent.waiting + unsent.failed;
  return (
    <>
      <PageHeading
        title="Messages"
        crumbs={[{ href: "/desk", text: "Desk" }]}
        facts={open === 0 ? "Everything has gone out." : `Tried again by themselves: ${unsent.waiting}. Given up: ${unsent.failed}.`}
      />
      <ActionForm action={retryDeliveriesAction} submit="Send what waits now" look="second" />
      <DeliveryTable deliveries={deliveries} zone={env().PROGRAMME_ZONE} caption="The last 200 mails, newest first" />
    </>
  );
}
