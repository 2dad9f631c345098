import { readConfig } from "./config";
import { startStripeStandIn } from "./start";
import type { StripeStandInOptions } from "./start";

const config = readConfig(process.env);
if (config.ok) await run(config.options);
else refuse(config.reason);

async function run(options: StripeStandInOptions): Promise<void> {
  try {
    const running = await startStripeStandIn({ ...options, report: (line) => process.stderr.write(`${line}\n`) });
    const end = () => void running.close();
    process.once("SIGTERM", end);
    process.once("SIGINT", end);
    process.stdout.write(`Payment stand-in listening on ${running.url}, webhooks to ${options.webhookUrl}\n`);
  } catch (error) {
    refuse(error instanceof Error ? error.message : String(error));
  }
}

function refuse(reason: string): void {
  process.stderr.write(`The payment stand-in did not start: ${reason}\n`);
  process.exitCode = 1;
}
