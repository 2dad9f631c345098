import pino from "pino";

/** One line of JSON an event. Never a name, an address or a health fact: ids only. */
export const log = pino({
  level: process.env.LOG_LEVEL ?? "info",
  base: null,
  timestamp: pino.stdTimeFunctions.isoTime,
  redact: { paths: ["*.email", "*.name", "*.password", "*.token"], censor: "[kept out]" },
});
