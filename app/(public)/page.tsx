import { addMonths } from "date-fns";
import Link from "next/link";
import { OutingRows } from "@/components/outings/outing-rows";
import { Call } from "@/components/ui/call";
import { listOutings } from "@/lib/outings/list-outings";
import { env } from "@/lib/shared/env";
import { ask } from "@/lib/web/ask";

export default async function HomePage() {
  const now = new Date();
  const outings = await ask(listOutings, { from: now.toISOString(), to: addMonths(now, 6).toISOString() });
  const next = outings.filter((outing) => outing.state !== "called off").slice(0, 3);
  return (
    <>
      <div className="pt-14 pb-8 grid gap-8 mid:grid-cols-[minmax(0,3fr)_minmax(0,2fr)] items-end">
        <div>
          <h1 className="text-[clamp(2.2rem,1.2rem+4vw,3.6rem)]">Come and hear what the shore is saying.</h1>
          <p className="text-[1.2rem] mt-4">
            Monthly outings for blind and partially sighted young people who like to listen, record and touch. A guide if you want
            one, a seat without a fee if you need one.
          </p>
          <p className="mt-6 flex flex-wrap gap-3">
            <Link className="button" href="/outings">
              See the next outings
            </Link>
            <Link className="button second" href="#day">
              How a day goes
            </Link>
          </p>
        </div>
        <Call name={env().PROGRAMME_NAME} className="w-full h-24 mid:h-36" />
      </div>

      <section aria-labelledby="next">
        <h2 id="next" className="mt-8 pb-1.5 border-b-2 border-edge">
          The next outings
        </h2>
        {next.length === 0 ? <p className="mt-4">No outings are planned for the next months. Have a look again soon, or call us.</p> : <OutingRows outings={next} />}
      </section>

      <section aria-labelledby="day" className="mt-14">
        <h2 id="day" className="pb-1.5 border-b-2 border-edge" tabIndex={-1}>
          How a day goes
        </h2>
        <ol className="mt-4 space-y-3 list-decimal pl-7 marker:font-bold">
          <li>A voice greets you at the meeting point and says its name. Directions come beforehand, leg by leg, for hands, ears and feet.</li>
          <li>Everybody gets a count-off number. We count with voices at every stop, so that a blind leader and a sighted one know the same thing.</li>
          <li>We listen, without talking, for a minute at a time. Then we tell each other what we heard.</li>
          <li>We touch a teaching model of that sound: left to right is time, low to high is pitch, and higher under the finger is louder.</li>
          <li>Record if you like, rest if you like. A guide is there when you want one, on the side you choose.</li>
          <li>We hand each child over to somebody on the family&rsquo;s own list.</li>
        </ol>
        <p className="mt-4">
          <Link href="/models">Meet the teaching models</Link>
        </p>
      </section>
    </>
  );
}
