/**
 * A reason to stop that a person can act on. It is printed as it stands, without a stack:
 * anything else that is thrown is a fault of ours and keeps its stack.
 */
export class CannotGoOn extends Error {
  /** @override */
  name = "CannotGoOn";
}
