import { openPaper } from "@/lib/roster/open-paper";
import { renderRoster } from "@/lib/roster/render-roster";
import { httpHandler } from "@/lib/web/http-handler";

/** A printed roster. Never kept by a cache: who may read it is asked each time, and each reading is noted. */
export const GET = httpHandler(openPaper, {
  read: (_request, params) => ({ paperId: params.id }),
  respond: async (paper) =>
    new Response(Buffer.from(await renderRoster(paper)), {
      headers: {
        "content-type": "application/pdf",
        "content-disposition": `inline; filename="roster-${paper.slug}-version-${paper.facts.version}-${paper.form.replace(" ", "-")}.pdf"`,
        "cache-control": "private, no-store",
      },
    }),
});
