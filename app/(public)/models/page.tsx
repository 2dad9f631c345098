import type { Metadata } from "next";
import Image from "next/image";
import Link from "next/link";
import { PageHeading } from "@/components/ui/page-heading";
import { listTeachingModels } from "@/lib/teaching-models/list-teaching-models";
import { ask } from "@/lib/web/ask";

export const metadata: Metadata = { title: "Teaching models" };

export default async function ModelsPage() {
  const models = await ask(listTeachingModels, {});
  return (
    <>
      <PageHeading
        title="Teaching models"
        facts="A sound you can touch: left to right is time, low to high is pitch, and higher under the finger is louder. Each can be printed."
      />
      {models.length === 0 && <p className="mt-6">There are no models in the catalogue yet.</p>}
      <ul className="mt-6">
        {models.map((model) => (
          <li key={model.id} className="outing-row wide:grid-cols-[12rem_minmax(0,1fr)]! grid-cols-1!">
            <Image src={`/api/models/${model.slug}/picture`} alt="" width={192} height={128} unoptimized className="border-2 border-edge w-48" />
            <div>
              <h2 className="text-[1.35rem]">
                <Link href={`/models/${model.slug}`} prefetch={false} className="text-ink decoration-marsh">
                  {model.title}
                </Link>
              </h2>
              <p className="mt-1.5">{model.concept}</p>
              <p className="text-quiet">For {model.forWhom.replace(/^For /i, "")}</p>
            </div>
          </li>
        ))}
      </ul>
    </>
  );
}
