import Link from "next/link";

export function SiteFooter({ programme, phone }: { programme: string; phone: string }) {
  return (
    <footer className="mt-20 border-t-2 border-edge">
      <div className="frame py-8 flex flex-wrap gap-x-10 gap-y-3">
        <p>
          <strong>{programme}</strong>
          <br />
          Call <a href={`tel:${phone.replaceAll(" ", "")}`}>{phone}</a>. We are glad to do any form with you by phone.
        </p>
        <ul className="flex flex-wrap gap-x-6">
          <li>
            <Link href="/waiver" prefetch={false} className="inline-block py-1.5">
              Read the waiver
            </Link>
          </li>
          <li>
            <Link href="/look" prefetch={false} className="inline-block py-1.5">
              Text size and colours
            </Link>
          </li>
        </ul>
      </div>
    </footer>
  );
}
