import { Facts } from "@/components/ui/facts";

type Contact = { name: string; relationship: string; phone: string };
type Person = {
  id: string;
  number: number | null;
  nameUsed: string;
  guardian: { name: string; phone: string | null } | null;
  guardianStays: string | null;
  contacts: Contact[];
  pickUp: { name: string; relationship: string }[];
  staffOnly: { legalName: string; transfer: string | null; reading: string } | null;
};

export function ContactLines({ people }: { people: Person[] }) {
  if (people.length === 0) return <p className="mt-4">Nobody is confirmed yet.</p>;
  return (
    <ul className="lines mt-4">
      {people.map((person) => (
        <li key={person.id}>
          <h2 className="text-[1.2rem]">
            {person.number} {person.nameUsed}
          </h2>
          <Facts
            rows={[
              ["Call first", <Phones key="call" contacts={person.contacts} />],
              ["Guardian", guardianInWords(person)],
              ["May collect", person.pickUp.map(({ name, relationship }) => (relationship ? `${name} (${relationship})` : name)).join(", ") || "nobody named: ask the coordinator"],
              person.staffOnly && ["Legal name", person.staffOnly.legalName],
              person.staffOnly && ["Reads", person.staffOnly.reading],
              person.staffOnly?.transfer ? ["To a vehicle seat", person.staffOnly.transfer] : null,
            ]}
          />
        </li>
      ))}
    </ul>
  );
}

function Phones({ contacts }: { contacts: Contact[] }) {
  if (contacts.length === 0) return "nobody named: call the coordinator";
  return contacts.map((contact) => (
    <span key={contact.phone + contact.name} className="block">
      {contact.name}
      {contact.relationship ? ` (${contact.relationship})` : ""}, <a href={`tel:${contact.phone.replace(/[^+\d]/g, "")}`}>{contact.phone}</a>
    </span>
  ));
}

function guardianInWords({ guardian, guardianStays }: Person): string {
  const name = guardian ? `${guardian.name}${guardian.phone ? `, ${guardian.phone}` : ""}` : "not known";
  return guardianStays ? `${name}; ${guardianStays}` : name;
}
