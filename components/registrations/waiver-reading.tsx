import { waiverBlocks } from "@/lib/waivers/waiver-text";

/** The waiver as real text with headings: no picture, no scroll box. */
export function WaiverReading({ body }: { body: string }) {
  return (
    <div className="space-y-4 mt-6">
      {waiverBlocks(body).map((block, index) =>
        block.kind === "heading" ? (
          <h2 key={index} className="mt-8 text-[1.3rem]">
            {block.text}
          </h2>
        ) : (
          <p key={index}>{block.text}</p>
        ),
      )}
    </div>
  );
}
