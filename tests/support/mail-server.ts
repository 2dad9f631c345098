import { createServer, type Socket } from "node:net";
import { onTestFinished } from "vitest";

export type Taken = { to: string; data: string };

/** What the server answers to RCPT TO: it takes the mail, or refuses it for now or for good, or hangs up on it. */
export type Mood = "takes" | "busy" | "unknown address" | "hangs up";

/**
 * A real SMTP server on a free port of 127.0.0.1 (RFC 5321, as much as a client that sends one mail needs).
 * `mood` may be changed at any time; `url` is where it listens.
 */
export async function startMailServer(mood: Mood = "takes") {
  const state = { mood, taken: [] as Taken[], url: "" };
  const sockets = new Set<Socket>();
  const server = createServer((socket) => {
    sockets.add(socket);
    socket.on("close", () => sockets.delete(socket));
    socket.on("error", () => socket.destroy());
    talk(socket, state);
  });
  await new Promise<void>((resolve) => server.listen(0, "127.0.0.1", resolve));
  const address = server.address();
  if (typeof address !== "object" || address === null) throw new Error("the mail server has no port");
  state.url = `smtp://127.0.0.1:${address.port}`;
  onTestFinished(() => {
    for (const socket of sockets) socket.destroy();
    server.close();
  });
  return state;
}

const refusals = { busy: "451 4.3.0 try again later", "unknown address": "550 5.1.1 no such address here" } as const;

function talk(socket: Socket, state: { mood: Mood; taken: Taken[] }): void {
  let waiting = "";
  let data: string[] | null = null;
  let to = "";
  const say = (line: string) => socket.write(`${line}\r\n`);
  const hear = (line: string): void => {
    if (data !== null) {
      if (line !== ".") return void data.push(line.replace(/^\.\./, "."));
      state.taken.push({ to, data: data.join("\r\n") });
      data = null;
      return void say("250 2.0.0 taken");
    }
    const command = line.slice(0, 4).toUpperCase();
    if (command === "RCPT") {
      if (state.mood === "hangs up") return void socket.destroy();
      if (state.mood !== "takes") return void say(refusals[state.mood]);
      to = /<(.*)>/.exec(line)?.[1] ?? "";
    }
    if (command === "DATA") {
      data = [];
      return void say("354 go on");
    }
    if (command === "QUIT") return void socket.end("221 bye\r\n");
    say("250 mail.saltgrass.example");
  };
  say("220 mail.saltgrass.example");
  socket.setEncoding("utf8");
  socket.on("data", (chunk: string) => {
    waiting += chunk;
    const lines = waiting.split("\r\n");
    waiting = lines.pop() ?? "";
    for (const line of lines) hear(line);
  });
}
