import { createInterface } from "node:readline";
import { endGroup } from "./process-group.mjs";

// A small program of its own, started by processes.mjs. It is told which process groups run ("+123")
// and which have ended ("-123"). When its input closes, its owner is gone, however it went: even
// after SIGKILL, when the owner could not clean up, whatever is left is ended here.

/** @type {Set<number>} */
const groups = new Set();

createInterface({ input: process.stdin })
  .on("line", (line) => {
    const group = Number(line.slice(1));
    if (line.startsWith("+")) groups.add(group);
    else groups.delete(group);
  })
  .on("close", async () => {
    await Promise.all([...groups].map((group) => endGroup(group, 3000)));
    process.exit(0);
  });
