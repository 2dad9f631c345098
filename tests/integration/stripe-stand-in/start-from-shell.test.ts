import { spawn } from "node:child_process";
import { once } from "node:events";
import { fileURLToPath } from "node:url";
import { describe, expect, it, onTestFinished } from "vitest";

const root = fileURLToPath(new URL("../../../", import.meta.url));

function start(variables: Record<string, string>) {
  const program = spawn(process.execPath, ["--import", "tsx", "scripts/stripe-stand-in/main.ts"], {
    cwd: root,
    env: { NODE_ENV: "test", PATH: process.env.PATH, ...variables },
  });
  onTestFinished(() => void program.kill("SIGKILL"));
  return program;
}

describe("the stand-in as a program", () => {
  it("says in one line where it listens, answers, and ends cleanly when told to", { timeout: 20_000 }, async () => {
    const program = start({ STRIPE_STAND_IN_PORT: "0" });
    const [line] = await once(program.stdout, "data");
    const [, url = ""] = /^Payment stand-in listening on (\S+), webhooks to \S+\n$/.exec(String(line)) ?? [];
    const health = await fetch(`${url}/_stand-in/health`);
    expect(await health.json()).toEqual({ ok: true });
    program.kill("SIGTERM");
    expect(await once(program, "exit")).toEqual([0, null]);
  });

  it("names the setting that is wrong and does not start", { timeout: 20_000 }, async () => {
    const program = start({ STRIPE_WEBHOOK_URL: "nowhere" });
    const [line] = await once(program.stderr, "data");
    expect(String(line)).toContain("STRIPE_WEBHOOK_URL is not a web address");
    expect(await once(program, "exit")).toEqual([1, null]);
  });
});
