import type { Metadata } from "next";
import { ActionForm } from "@/components/forms/action-form";
import { TextField } from "@/components/forms/text-field";
import { Caution } from "@/components/ui/caution";
import { PageHeading } from "@/components/ui/page-heading";
import { listAllSites } from "@/lib/outings/list-all-sites";
import { env } from "@/lib/shared/env";
import { ask } from "@/lib/web/ask";
import { addSiteAction } from "./actions";

export const metadata: Metadata = { title: "Sites" };

export default async function SitesPage() {
  const sites = await ask(listAllSites, {});
  return (
    <>
      <PageHeading title="Sites" crumbs={[{ href: "/desk", text: "Desk" }]} facts="The places we go to." />
      {sites.length === 0 ? (
        <p className="mt-6">None yet. Add the first below.</p>
      ) : (
        <ul className="lines mt-6">
          {sites.map((site) => (
            <li key={site.id}>
              <p className="font-bold text-[1.15rem]">{site.name}</p>
              <p>
                {site.landManager}. {site.ground}
              </p>
              <p className="text-quiet">
                Meeting point: {site.meetingPoint} Clocks: {site.zone}.
              </p>
            </li>
          ))}
        </ul>
      )}
      <Caution>Surfaces change with weather and season. Go and look before each outing, with a blind tester if you can.</Caution>
      <section aria-labelledby="add" className="mt-10">
        <h2 id="add">Add a site</h2>
        <ActionForm action={addSiteAction} submit="Add the site">
          <TextField name="name" label="Name" />
          <TextField name="landManager" label="Who manages the land" />
          <TextField name="ground" label="Underfoot" hint="Such as packed gravel, then firm sand; one slope." />
          <TextField name="meetingPoint" label="Meeting point, in a sentence" hint="Stands on the roster." />
          <TextField name="zone" label="Time zone" isShort value={env().PROGRAMME_ZONE} hint="By its IANA name." />
        </ActionForm>
      </section>
    </>
  );
}
