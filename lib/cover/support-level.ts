/** How much of an adult somebody takes, from one adult for one person down to the policy's lightest ratio. */
export const supportLevels = ["constant", "close", "occasional", "minimal"] as const;
export type SupportLevel = (typeof supportLevels)[number];
