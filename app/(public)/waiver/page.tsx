import type { Metadata } from "next";
import { WaiverReading } from "@/components/registrations/waiver-reading";
import { PageHeading } from "@/components/ui/page-heading";
import { showWaiver } from "@/lib/waivers/show-waiver";
import { ask } from "@/lib/web/ask";

export const metadata: Metadata = { title: "The waiver" };

export default async function WaiverPage() {
  const text = await ask(showWaiver, {});
  return (
    <>
      <PageHeading title={text.title} facts={`Version ${text.version}. This is the whole text; you sign it when you register a child.`} />
      <WaiverReading body={text.body} />
      <p className="mt-8 text-quiet">
        This text has a fingerprint that is kept with every signature: <code className="break-all">{text.sha256}</code>
      </p>
    </>
  );
}
