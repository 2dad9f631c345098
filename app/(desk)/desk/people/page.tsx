import type { Metadata } from "next";
import { ActionForm } from "@/components/forms/action-form";
import type { Choice } from "@/components/forms/choice";
import { Choices } from "@/components/forms/choices";
import { SelectField } from "@/components/forms/select-field";
import { TextField } from "@/components/forms/text-field";
import { DataTable } from "@/components/ui/data-table";
import { PageHeading } from "@/components/ui/page-heading";
import { abilitiesInWords } from "@/lib/helpers/helper";
import { listPeople } from "@/lib/people/list-people";
import { mayInvite } from "@/lib/people/person-policy";
import { hasRole, roles, type Role } from "@/lib/shared/actor";
import { plainDayInWords } from "@/lib/shared/dates";
import { ask } from "@/lib/web/ask";
import { currentActor } from "@/lib/web/session";
import { changeClearanceAction, inviteAction, takeRoleAction } from "./actions";

export const metadata: Metadata = { title: "People" };

const roleChoices: Record<Role, string> = {
  chaperone: "Chaperone: comes along and guides",
  leader: "Leader: runs the day",
  coordinator: "Coordinator: plans and admits",
  admin: "Admin: people, policies, settings",
  guardian: "Guardian: registers children",
};

export default async function PeoplePage() {
  const people = await ask(listPeople, {});
  const actor = await currentActor();
  const helpers = people.filter((person) => person.helper !== null);
  const mayGive: Choice[] = roles.filter((role) => mayInvite(actor, role)).map((role) => ({ value: role, label: roleChoices[role] }));
  return (
    <>
      <PageHeading title="People" crumbs={[{ href: "/desk", text: "Desk" }]} facts={`${people.length} accounts, ${helpers.length} of them people who help.`} />
      <section aria-labelledby="helpers" className="mt-8">
        <h2 id="helpers">Who helps</h2>
        <DataTable
          caption="Adults who help, what they can do and until when they are cleared"
          columns={["Name", "Roles", "Can", "Of age", "Cleared to"]}
          rows={helpers.map((person) => ({
            key: person.id,
            name: person.name,
            cells: [
              person.roles.join(", "),
              abilitiesInWords(person.helper),
              person.helper?.isAdult ? "yes" : "not said",
              person.helper?.clearedUntil ? plainDayInWords(person.helper.clearedUntil) : "not cleared",
            ],
          }))}
        />
        <h3 className="mt-8">Note a clearance</h3>
        <p className="mt-1">Only the last day is kept; what was found in a check is not.</p>
        <ActionForm action={changeClearanceAction} submit="Save" look="second" scope="clearance">
          <SelectField name="personId" label="Person" empty="Choose a person" choices={helpers.map((person) => ({ value: person.id, label: person.name }))} />
          <TextField name="clearedUntil" label="Cleared to" isShort hint="Year, month and day. Empty: not cleared." />
        </ActionForm>
      </section>
      <section aria-labelledby="invite" className="mt-14">
        <h2 id="invite">Invite somebody</h2>
        <ActionForm action={inviteAction} submit="Send the invitation" scope="invite">
          <TextField name="name" label="Name" />
          <TextField name="email" label="E-mail address" type="email" spellCheck={false} />
          <Choices name="role" legend="What will they do?" pick="one" choices={mayGive} />
        </ActionForm>
      </section>
      {hasRole(actor, "admin") && (
        <section aria-labelledby="take" className="mt-14">
          <h2 id="take">Take a role away</h2>
          <p className="mt-1">The person is signed out everywhere at once. What they did stays.</p>
          <ActionForm action={takeRoleAction} submit="Take it away" look="stop" scope="take">
            <SelectField name="personId" label="Person" empty="Choose a person" choices={people.map((person) => ({ value: person.id, label: person.name }))} />
            <SelectField name="role" label="Role" empty="Choose a role" choices={roles.map((role) => ({ value: role, label: role }))} />
          </ActionForm>
        </section>
      )}
      <section aria-labelledby="all" className="mt-14">
        <h2 id="all">All accounts</h2>
        <ul className="lines mt-3">
          {people.map((person) => (
            <li key={person.id}>
              <strong>{person.name}</strong>, {person.email}. {person.roles.join(", ") || "no role yet"}
              {person.emailConfirmed ? "" : "; e-mail not confirmed yet"}.
            </li>
          ))}
        </ul>
      </section>
    </>
  );
}
