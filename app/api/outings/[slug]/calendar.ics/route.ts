import { showOutingCalendar } from "@/lib/outings/show-outing-calendar";
import { httpHandler } from "@/lib/web/http-handler";

export const GET = httpHandler(showOutingCalendar, {
  read: (_request, params) => ({ slug: params.slug }),
  respond: ({ slug, calendar }) =>
    new Response(calendar, {
      headers: {
        "content-type": "text/calendar; charset=utf-8",
        "content-disposition": `attachment; filename="${slug}.ics"`,
      },
    }),
});
