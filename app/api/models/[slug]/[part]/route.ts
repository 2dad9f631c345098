import { showModelFile } from "@/lib/teaching-models/show-model-file";
import { fileResponse } from "@/lib/web/file-response";
import { httpHandler } from "@/lib/web/http-handler";

export const GET = httpHandler(showModelFile, {
  read: (_request, params) => ({ slug: params.slug, part: params.part }),
  respond: ({ file, name, part }, request) =>
    fileResponse(file, { name, range: request.headers.get("range"), download: part === "printable" }),
});
