import type { Metadata } from "next";
import { PageHeading } from "@/components/ui/page-heading";
import { showOutingForm } from "@/lib/outings/show-outing-form";
import { newId } from "@/lib/shared/ids";
import { ask } from "@/lib/web/ask";
import { OutingForm } from "../outing-form";

export const metadata: Metadata = { title: "Plan an outing" };

export default async function NewOutingPage() {
  const form = await ask(showOutingForm, {});
  return (
    <>
      <PageHeading title="Plan an outing" crumbs={[{ href: "/desk", text: "Desk" }]} facts="It is kept as a draft until you publish it." />
      <OutingForm {...form} requestId={newId()} />
    </>
  );
}
