import type { Metadata } from "next";
import Image from "next/image";
import { Caution } from "@/components/ui/caution";
import { Facts } from "@/components/ui/facts";
import { PageHeading } from "@/components/ui/page-heading";
import { showTeachingModel } from "@/lib/teaching-models/show-teaching-model";
import { ask } from "@/lib/web/ask";

type Props = { params: Promise<{ slug: string }> };

export async function generateMetadata({ params }: Props): Promise<Metadata> {
  const model = await ask(showTeachingModel, await params);
  return { title: model.title, description: model.concept };
}

export default async function ModelPage({ params }: Props) {
  const model = await ask(showTeachingModel, await params);
  const { facts } = model;
  const { scale, making } = facts;
  const file = (part: string) => `/api/models/${model.slug}/${part}`;
  return (
    <>
      <PageHeading title={model.title} crumbs={[{ href: "/models", text: "Teaching models" }]} facts={model.concept} />
      <div className="columns mt-4">
        <div>
          <Image src={file("picture")} alt={facts.pictureAlt} width={1200} height={800} unoptimized className="border-2 border-edge" />
          <h2 className="mt-8">What it is like</h2>
          <p className="mt-2">{facts.description}</p>
          <h2 className="mt-10">Finger tour</h2>
          <p className="mt-2 text-quiet">Distances are from the left edge and from the lower edge. Take your time; stop wherever you like.</p>
          <ol className="mt-3 space-y-2 list-decimal pl-7 marker:font-bold">
            {facts.fingerTour.map((step) => (
              <li key={step}>{step}</li>
            ))}
          </ol>
        </div>
        <div className="space-y-6">
          <section className="panel" aria-labelledby="sound">
            <h2 id="sound" className="text-[1.2rem]">
              The sound, {Math.round(facts.audioSeconds)} seconds
            </h2>
            <p className="mt-2 mb-3">{facts.audioInWords}</p>
            <audio controls preload="none" src={file("audio")} aria-label={`The sound of ${model.title}`} />
            <p className="mt-3">
              <a href={file("audio")}>
                Download the sound <span className="text-quiet">(WAV, {size(model.audio.bytes)})</span>
              </a>
            </p>
          </section>
          <section className="panel" aria-labelledby="print">
            <h2 id="print" className="text-[1.2rem]">
              Print it
            </h2>
            <p className="mt-2">
              <a href={file("printable")}>
                Download the printable file <span className="text-quiet">(STL, {size(model.printable.bytes)})</span>
              </a>
            </p>
            <p className="mt-3">{making.orientation}</p>
            <p className="mt-2">{making.cutCorner}</p>
            <ul className="mt-2 list-disc pl-6 space-y-1">
              {making.notes.map((note) => (
                <li key={note}>{note}</li>
              ))}
            </ul>
          </section>
        </div>
      </div>
      <h2 className="mt-12 pb-1.5 border-b-2 border-edge">Size and scale</h2>
      <Facts
        rows={[
          ["Size", `${scale.widthMm} mm wide, ${scale.heightMm} mm high, ${scale.baseMm} mm thick with up to ${scale.reliefMmMax} mm of relief`],
          ["Time", `${scale.secondsPerCm} seconds a centimetre, ${scale.durationSeconds} seconds from left to right`],
          ["Pitch", `${scale.lowestHz} to ${scale.highestHz} hertz from bottom to top, ${scale.axis === "log" ? "equal steps an octave" : "equal steps a hertz"}`],
          ["Smallest gap a finger can tell", `${scale.smallestGapSeconds} seconds: sounds nearer than that blend under the finger`],
          ["For whom", `${facts.forWhom} (${facts.level})`],
          ["Copies we have", String(facts.copies)],
          ["Material", `${making.material}, layers of ${making.layerHeightMm} mm`],
          ["Version", `${facts.version}, ${facts.status}`],
        ]}
      />
      <h2 className="mt-10">Listen for</h2>
      <ul className="mt-2 list-disc pl-6 space-y-1">
        {facts.listenFor.map((line) => (
          <li key={line}>{line}</li>
        ))}
      </ul>
      <Caution>{facts.safety}</Caution>
    </>
  );
}

function size(bytes: number): string {
  return bytes >= 1_000_000 ? `${(bytes / 1_000_000).toFixed(1)} MB` : `${Math.ceil(bytes / 1000)} KB`;
}
