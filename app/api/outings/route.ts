import { listOutings } from "@/lib/outings/list-outings";
import { httpHandler } from "@/lib/web/http-handler";

export const GET = httpHandler(listOutings, {
  read: (request) => ({
    from: request.nextUrl.searchParams.get("from") ?? "",
    to: request.nextUrl.searchParams.get("to") ?? "",
  }),
});
