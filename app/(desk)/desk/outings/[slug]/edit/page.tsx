import type { Metadata } from "next";
import { PageHeading } from "@/components/ui/page-heading";
import { showOutingForm } from "@/lib/outings/show-outing-form";
import { ask } from "@/lib/web/ask";
import { pathTo } from "@/lib/web/paths";
import { OutingForm } from "../../outing-form";

export const metadata: Metadata = { title: "Change an outing" };

type Props = { params: Promise<{ slug: string }> };

export default async function EditOutingPage({ params }: Props) {
  const { slug } = await params;
  const form = await ask(showOutingForm, { slug });
  return (
    <>
      <PageHeading
        title="Change the outing"
        crumbs={[{ href: "/desk", text: "Desk" }, { href: pathTo.deskOuting(slug), text: form.values?.title ?? slug }]}
        facts="If the day, the hours, the site or the meeting point change, everybody who comes is told by mail."
      />
      <OutingForm {...form} requestId="" />
    </>
  );
}
