import { hash, verify } from "@node-rs/argon2";

/** Argon2id, 19 MiB and two passes: the first of the settings OWASP's password storage sheet lists. */
const settings = { memoryCost: 19_456, timeCost: 2, parallelism: 1 };

let decoy: Promise<string> | undefined;

export function hashPassword(password: string): Promise<string> {
  return hash(password, settings);
}

/** Takes as long for an address nobody has as for a wrong password, so time tells nothing. */
export async function isPassword(stored: string | null, typed: string): Promise<boolean> {
  decoy ??= hash("nobody has this one", settings);
  const right = await verify(stored ?? (await decoy), typed, settings);
  return stored !== null && right;
}
