import Link from "next/link";

const rooms = [
  { path: "", text: "Readiness" },
  { path: "/helpers", text: "Adults" },
  { path: "/cover", text: "Cover" },
  { path: "/papers", text: "Papers" },
  { path: "/contacts", text: "Contacts" },
] as const;

/** The rooms of one outing at the desk. */
export function DeskRooms({ slug, here }: { slug: string; here: (typeof rooms)[number]["text"] | "none" }) {
  return (
    <nav aria-label="This outing" className="my-4 no-print">
      <ul className="flex flex-wrap gap-x-6 border-b border-rule">
        {rooms.map((room) => (
          <li key={room.path}>
            <Link
              href={`/desk/outings/${slug}${room.path}`}
              aria-current={room.text === here ? "page" : undefined}
              className={`inline-block py-2.5 text-ink font-semibold ${room.text === here ? "underline decoration-marsh decoration-4" : "no-underline hover:underline"}`}
            >
              {room.text}
            </Link>
          </li>
        ))}
      </ul>
    </nav>
  );
}
