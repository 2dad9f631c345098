type Adult = { id: string; name: string; role: string; abilities: string; counts: boolean; standing: string; share: number[] };
type Person = { id: string; number: number | null; nameUsed: string; adultId: string | null };

/** Adults and the people with them. The bar shows how much of one adult they take; the words beside it say the same. */
export function AdultsWithPeople({ adults, people }: { adults: Adult[]; people: Person[] }) {
  const known = new Set(adults.map((adult) => adult.id));
  const alone = people.filter((person) => person.adultId === null || !known.has(person.adultId));
  return (
    <div className="grid gap-4">
      {alone.length > 0 && (
        <section className="adult" aria-label="Nobody yet">
          <div className="bg-shell!">
            <h3>Nobody yet</h3>
            <p className="text-quiet">{alone.length === 1 ? "1 person" : `${alone.length} people`}</p>
          </div>
          <div>
            <People people={alone} isWanting nobody="" />
          </div>
        </section>
      )}
      {adults.map((adult) => (
        <section key={adult.id} className="adult" aria-label={adult.name}>
          <div>
            <h3>{adult.name}</h3>
            <p className="text-quiet">
              {adult.role === "leader" ? "Leader. " : adult.role === "guardian" ? "Guardian. " : ""}
              {adult.abilities} {adult.standing}
            </p>
            <Load share={adult.share} />
          </div>
          <div>
            <People people={people.filter((person) => person.adultId === adult.id)} nobody={adult.counts ? "Nobody paired. Free for the group." : "Nobody paired."} />
          </div>
        </section>
      ))}
    </div>
  );
}

function People({ people, nobody, isWanting = false }: { people: Person[]; nobody: string; isWanting?: boolean }) {
  if (people.length === 0) return <p className="text-quiet">{nobody}</p>;
  return (
    <ul className="flex flex-wrap gap-2.5">
      {people.map((person) => (
        <li key={person.id} className={`pill ${isWanting ? "wanting" : ""}`}>
          <b>{person.number ?? "?"}</b>
          {person.nameUsed}
        </li>
      ))}
    </ul>
  );
}

function Load({ share }: { share: number[] }) {
  const total = share.reduce((sum, part) => sum + part, 0);
  const most = Math.max(100, total);
  return (
    <>
      <svg viewBox="0 0 200 14" className="load w-full h-3.5 mt-2" aria-hidden="true" preserveAspectRatio="none">
        <rect x="1" y="1" width="198" height="12" fill="var(--card)" stroke="var(--edge)" strokeWidth="2" />
        {share.map((part, index) => {
          const before = share.slice(0, index).reduce((sum, one) => sum + one, 0);
          const x = (before / most) * 196 + 2;
          return <rect key={index} x={x} y="2" width={Math.max(1, (part / most) * 196 - 2)} height="10" fill={total > 100 ? "var(--madder)" : "var(--marsh)"} />;
        })}
      </svg>
      <p className="text-quiet">{total} percent of one adult</p>
    </>
  );
}
