import type { Metadata } from "next";
import { PageHeading } from "@/components/ui/page-heading";
import { newId } from "@/lib/shared/ids";
import { currentActor } from "@/lib/web/session";
import { ChildForm } from "./child-form";

export const metadata: Metadata = { title: "Add a child" };

type Props = { searchParams: Promise<{ back?: string }> };

export default async function NewChildPage({ searchParams }: Props) {
  await currentActor();
  const { back = "" } = await searchParams;
  return (
    <>
      <PageHeading title="Add a child" crumbs={[{ href: "/family", text: "Your family" }]} facts="Three answers. What helps on an outing comes after." />
      <ChildForm requestId={newId()} back={back} />
    </>
  );
}
