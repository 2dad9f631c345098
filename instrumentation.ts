/** Runs once when the server starts. */
export async function register(): Promise<void> {
  if (process.env.NEXT_RUNTIME !== "nodejs") return;
  const { env } = await import("./lib/shared/env");
  env(); // refuses to start on a configuration that cannot work
  const { startClock } = await import("./lib/web/outbox");
  startClock();
}
