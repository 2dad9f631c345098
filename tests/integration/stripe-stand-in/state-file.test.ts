import { mkdtempSync, rmSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { describe, expect, it, onTestFinished } from "vitest";
import { startStripeStandIn } from "../../../scripts/stripe-stand-in/start";
import { paidIntentId, sessionParams, startWithReceiver } from "./running-stand-in";

function newStateFile(): string {
  const folder = mkdtempSync(join(tmpdir(), "stripe-stand-in-"));
  onTestFinished(() => rmSync(folder, { recursive: true }));
  return join(folder, "state.json");
}

describe("a state file", () => {
  it("brings payments, keys and undelivered webhooks through a restart", async () => {
    const stateFile = newStateFile();
    const before = await startWithReceiver({ stateFile });
    await before.control("webhooks/hold");
    const intentId = await paidIntentId(before.stripe);
    const options = { idempotencyKey: "reg_9/1" };
    const open = await before.stripe.checkout.sessions.create(sessionParams(), options);
    await before.standIn.close();

    const after = await startWithReceiver({ stateFile });
    expect((await after.stripe.paymentIntents.retrieve(intentId)).status).toBe("succeeded");
    expect((await after.stripe.checkout.sessions.create(sessionParams(), options)).id).toBe(open.id);
    await after.control("webhooks/settle");
    expect(before.receiver.received).toHaveLength(0);
    expect(after.receiver.received).toHaveLength(1);
  });

  it("is refused when it holds something else", async () => {
    const stateFile = newStateFile();
    writeFileSync(stateFile, '{"sessions": 3}');
    await expect(startStripeStandIn({ stateFile })).rejects.toThrow();
  });
});
