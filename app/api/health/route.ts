import { checkHealth } from "@/lib/web/check-health";
import { httpHandler } from "@/lib/web/http-handler";

export const GET = httpHandler(checkHealth, { read: () => ({}) });
