import { describe, expect, it } from "vitest";
import { knex } from "@/db/connection";
import { composeLetter } from "@/emails/compose-letter";
import { deliverDue } from "@/lib/messages/deliver-due";
import { listDeliveries } from "@/lib/messages/list-deliveries";
import { retryAfterMinutes } from "@/lib/messages/message";
import { queueMessage, takeDueMessage } from "@/lib/messages/message-store";
import { retryDeliveries } from "@/lib/messages/retry-deliveries";
import { minutesLater } from "@/lib/shared/dates";
import { conflict, ok } from "@/lib/shared/outcome";
import { createMailTransport } from "@/lib/web/mail-transport";
import { makeCoordinator } from "../../support/actors";
import { startMailServer } from "../../support/mail-server";
import { allowed, makeWorld, wait, type World } from "../../support/world";

const secret = "s".repeat(43);

function queueLink(world: World, toAddress = "ada@example.org"): void {
  queueMessage(world.conn, world.now, { kind: "sign-in-link", facts: { name: "Ada", link: `http://127.0.0.1:3000/link/${secret}` }, toAddress });
}

function mailerOf(world: World, url: string) {
  const send = createMailTransport({ SMTP_URL: url, MAIL_FROM: "Saltgrass <outings@saltgrass.example>" });
  return { compose: composeLetter, send, clock: () => world.now };
}

async function deliveries(world: World) {
  const coordinator = makeCoordinator(world, `Ines ${world.now}`);
  return allowed(world, coordinator, listDeliveries, {});
}

describe("mail that can be sent", () => {
  it("arrives with its subject and complete text, once, and is noted as sent without the link's secret", async () => {
    const world = makeWorld();
    const server = await startMailServer();
    queueLink(world);
    const mailer = mailerOf(world, server.url);
    expect(await deliverDue(world.conn, mailer)).toEqual({ sent: 1, failed: 0 });
    expect(await deliverDue(world.conn, mailer)).toEqual({ sent: 0, failed: 0 });
    expect(server.taken.map(({ to }) => to)).toEqual(["ada@example.org"]);
    expect(server.taken[0]?.data).toContain("Subject: Your link to sign in, good for 30 minutes");
    const [noted] = (await deliveries(world)).deliveries;
    expect(noted).toMatchObject({ state: "sent", attempts: 1, sentAt: world.now });
    expect(noted?.textBody).toContain("/link/(kept out)");
    expect(JSON.stringify(world.conn.all(knex("messages").select("facts", "text_body")))).not.toContain(secret);
  });

  it("sent again after a crash between sending and noting keeps its message id, so a mail program shows it once", async () => {
    const world = makeWorld();
    const server = await startMailServer();
    queueLink(world);
    const mailer = mailerOf(world, server.url);
    const due = takeDueMessage(world.conn, world.now);
    if (!due) throw new Error("a message was due");
    await mailer.send(due.toAddress, await composeLetter(due.message), due.id); // and here the program stops
    expect(await deliverDue(world.conn, mailer)).toEqual({ sent: 0, failed: 0 });
    wait(world, 10);
    expect(await deliverDue(world.conn, mailer)).toEqual({ sent: 1, failed: 0 });
    const ids = server.taken.map(({ data }) => /^Message-ID: (.*)$/im.exec(data)?.[1]);
    expect(ids).toEqual([`<${due.id}@dunlin>`, `<${due.id}@dunlin>`]);
  });

  it("of which one address is refused does not hold up the others", async () => {
    const world = makeWorld();
    const server = await startMailServer();
    for (const address of ["a@example.org", "b@example.org", "c@example.org"]) queueLink(world, address);
    const mailer = mailerOf(world, server.url);
    const send: typeof mailer.send = (to, letter, id) => {
      server.mood = to.startsWith("b") ? "unknown address" : "takes";
      return mailer.send(to, letter, id);
    };
    expect(await deliverDue(world.conn, { ...mailer, send })).toEqual({ sent: 2, failed: 1 });
    expect(server.taken.map(({ to }) => to)).toEqual(["a@example.org", "c@example.org"]);
  });
});

describe("while the mail server refuses", () => {
  it("a mail waits longer each time, then is failed and shown to staff with the reason, and is never lost", async () => {
    const world = makeWorld();
    const server = await startMailServer("busy");
    queueLink(world);
    const mailer = mailerOf(world, server.url);
    const waits: number[] = [];
    for (const minutes of retryAfterMinutes) {
      expect(await deliverDue(world.conn, mailer)).toEqual({ sent: 0, failed: 1 });
      const row = world.conn.first(knex("messages").select("state", "next_attempt_at"));
      expect(row).toEqual({ state: "queued", next_attempt_at: minutesLater(world.now, minutes) });
      wait(world, minutes - 1);
      expect(await deliverDue(world.conn, mailer)).toEqual({ sent: 0, failed: 0 });
      wait(world, 1);
      waits.push(minutes);
    }
    expect(waits).toEqual(waits.toSorted((one, other) => one - other));
    expect(await deliverDue(world.conn, mailer)).toEqual({ sent: 0, failed: 1 });
    const shown = await deliveries(world);
    expect(shown.unsent).toEqual({ waiting: 0, failed: 1 });
    expect(shown.deliveries).toMatchObject([{ state: "failed", attempts: 7, lastProblem: expect.stringContaining("try again later") }]);
    wait(world, 100_000);
    expect(await deliverDue(world.conn, mailer)).toEqual({ sent: 0, failed: 0 });
  });

  it.each(["busy", "unknown address", "hangs up"] as const)("(%s) staff see it wait, and can send it at once when it is back", async (mood) => {
    const world = makeWorld();
    const server = await startMailServer(mood);
    queueLink(world);
    const mailer = mailerOf(world, server.url);
    await deliverDue(world.conn, mailer);
    expect((await deliveries(world)).unsent).toEqual({ waiting: 1, failed: 0 });
    server.mood = "takes";
    expect(await allowed(world, makeCoordinator(world), retryDeliveries, {})).toEqual({ messages: 1 });
    expect(await deliverDue(world.conn, mailer)).toEqual({ sent: 1, failed: 0 });
    expect(server.taken).toHaveLength(1);
  });

  it("or is not there at all, the same holds", async () => {
    const world = makeWorld();
    const server = await startMailServer();
    queueLink(world);
    const nowhere = mailerOf(world, "smtp://127.0.0.1:1"); // a port nobody listens on
    expect(await deliverDue(world.conn, nowhere)).toEqual({ sent: 0, failed: 1 });
    wait(world, retryAfterMinutes[0]);
    expect(await deliverDue(world.conn, mailerOf(world, server.url))).toEqual({ sent: 1, failed: 0 });
  });
});

describe("the outbox", () => {
  it("keeps a mail only if the work it belongs to is kept", () => {
    const world = makeWorld();
    world.conn.transaction(() => {
      queueLink(world);
      return conflict("no", "Not after all.");
    });
    expect(world.conn.all(knex("messages").select("id"))).toEqual([]);
    world.conn.transaction(() => {
      queueLink(world);
      return ok({});
    });
    expect(world.conn.all(knex("messages").select("id"))).toHaveLength(1);
  });

  it("gives a due mail to one round only", () => {
    const world = makeWorld();
    queueLink(world);
    expect(takeDueMessage(world.conn, world.now)).not.toBeNull();
    expect(takeDueMessage(world.conn, world.now)).toBeNull();
  });
});
