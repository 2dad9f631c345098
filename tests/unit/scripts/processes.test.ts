import { spawn } from "node:child_process";
import { createInterface } from "node:readline";
import { once } from "node:events";
import path from "node:path";
import { afterEach, describe, expect, it } from "vitest";
import { CannotGoOn } from "@/scripts/cannot-go-on.mjs";
import { isFree, freePorts, requireFree } from "@/scripts/ports.mjs";
import { groupIsAlive } from "@/scripts/process-group.mjs";
import { createProcesses, untilAnswers, whileAllRun } from "@/scripts/processes.mjs";
import type { Processes } from "@/scripts/processes.mjs";

const started: Processes[] = [];

function newProcesses(graceMs = 2000) {
  const written: string[] = [];
  const processes = createProcesses({ graceMs, write: (text: string) => void written.push(text) });
  started.push(processes);
  return { processes, written };
}

afterEach(async () => {
  await Promise.all(started.splice(0).map((processes) => processes.stopAll()));
});

/** A server that answers 200 with its process id; `before` runs first. */
const server = (port: number, before = "") => [
  "-e",
  `${before};
  const server = require("node:http").createServer((_, answer) => answer.end(String(process.pid)));
  server.listen(${port}, "127.0.0.1", () => console.log("listening"));`,
];

describe("a started process", () => {
  it("is waited for until it answers, and is gone after stopping", async () => {
    const { processes, written } = newProcesses();
    const { app: port } = await freePorts();
    const handle = processes.start({ name: "tiny", args: server(port) });
    await untilAnswers(handle, `http://127.0.0.1:${port}`, { withinMs: 10_000 });

    expect(await (await fetch(`http://127.0.0.1:${port}`)).text()).toBe(String(handle.pid));
    expect(groupIsAlive(handle.pid)).toBe(true);
    expect(written.join("")).toContain("tiny    | listening");

    await processes.stopAll();
    expect(groupIsAlive(handle.pid)).toBe(false);
    expect(await isFree(port)).toBe(true);
  });

  it("takes along what it started itself", async () => {
    const { processes } = newProcesses();
    const { app: port } = await freePorts();
    const grandchild = JSON.stringify(server(port));
    const parent = `require("node:child_process").spawn(process.execPath, ${grandchild}); setInterval(() => {}, 1000)`;
    const handle = processes.start({ name: "parent", args: ["-e", parent] });
    await untilAnswers(handle, `http://127.0.0.1:${port}`, { withinMs: 10_000 });

    await processes.stopAll();
    expect(groupIsAlive(handle.pid)).toBe(false);
    expect(await isFree(port)).toBe(true);
  });

  it("is ended by force when it does not end when asked", async () => {
    const { processes } = newProcesses(100);
    const { app: port } = await freePorts();
    const handle = processes.start({ name: "deaf", args: server(port, `process.on("SIGTERM", () => {})`) });
    await untilAnswers(handle, `http://127.0.0.1:${port}`, { withinMs: 10_000 });

    await processes.stopAll();
    expect(await handle.ended).toEqual({ code: null, signal: "SIGKILL" });
    expect(groupIsAlive(handle.pid)).toBe(false);
  });

  it("that ends before it answers is reported with its last lines, without waiting longer", async () => {
    const { processes } = newProcesses();
    const handle = processes.start({
      name: "broken",
      args: ["-e", `console.error("no such table"); process.exit(3)`],
      output: "kept",
    });
    const waiting = untilAnswers(handle, "http://127.0.0.1:9", { withinMs: 60_000 });
    await expect(waiting).rejects.toThrow(/broken ended \(exit code 3\)\.\nno such table/);
  });

  it("that never answers is given up after the time allowed", async () => {
    const { processes } = newProcesses();
    const handle = processes.start({ name: "silent", args: ["-e", "setInterval(() => {}, 1000)"] });
    const waiting = untilAnswers(handle, "http://127.0.0.1:9", { withinMs: 200 });
    await expect(waiting).rejects.toThrow(/silent was not ready at .* \(no answer yet\)/);
  });

  it("that stops by itself is a reason to stop them all", async () => {
    const { processes } = newProcesses();
    const one = processes.start({ name: "lasting", args: ["-e", "setInterval(() => {}, 1000)"] });
    const other = processes.start({ name: "short", args: ["-e", "process.exit(1)"] });
    await expect(whileAllRun([one, other])).rejects.toThrow("short stopped by itself (exit code 1).");
  });
});

describe("a command that is run to its end", () => {
  it("gives what it wrote to standard output apart from its complaints", async () => {
    const { processes } = newProcesses();
    const args = ["-e", `console.error("a warning"); console.log(JSON.stringify({ role: "guardian" }))`];
    const { ok, stdout, lastLines } = await processes.run({ name: "seed", args, output: "kept" });
    expect(ok).toBe(true);
    expect(JSON.parse(stdout)).toEqual({ role: "guardian" });
    expect(lastLines).toContain("a warning");
  });

  it("that is not installed is refused in words", async () => {
    const { processes } = newProcesses();
    const running = processes.run({ name: "tool", command: "a-program-nobody-has", args: [] });
    await expect(running).rejects.toThrow(CannotGoOn);
    await expect(running).rejects.toThrow(/"a-program-nobody-has" could not be started/);
  });
});

it("leaves nothing behind when the owner is killed and cannot clean up", async () => {
  const { app: port } = await freePorts();
  const owner = `
    import { createProcesses, untilAnswers } from ${JSON.stringify(path.resolve("scripts/processes.mjs"))};
    const handle = createProcesses().start({ name: "orphan", args: ${JSON.stringify(server(port))}, output: "kept" });
    await untilAnswers(handle, "http://127.0.0.1:${port}");
    console.log(handle.pid);
    setInterval(() => {}, 1000);`;
  const child = spawn(process.execPath, ["--input-type=module", "-e", owner], { stdio: ["ignore", "pipe", "inherit"] });
  const [line] = await once(createInterface({ input: child.stdout }), "line");
  const orphan = Number(line);
  expect(groupIsAlive(orphan)).toBe(true);

  child.kill("SIGKILL");
  await once(child, "exit");
  await expect.poll(() => groupIsAlive(orphan), { timeout: 10_000 }).toBe(false);
});

it("a port in use is named with the variable that changes it", async () => {
  const { processes } = newProcesses();
  const ports = await freePorts();
  const handle = processes.start({ name: "other", args: server(ports.app) });
  await untilAnswers(handle, `http://127.0.0.1:${ports.app}`, { withinMs: 10_000 });

  const sentence = `Port ${ports.app} is in use by another program: set PORT to a free one, for example PORT=`;
  await expect(requireFree(ports)).rejects.toThrow(sentence);
  await expect(requireFree(ports, ["mail", "smtp"])).resolves.toBeUndefined();
});
