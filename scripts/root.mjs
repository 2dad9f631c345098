import path from "node:path";

/** The checkout, wherever the command was typed. */
export const root = path.dirname(import.meta.dirname);

/** @param {...string} parts */
export const inRoot = (...parts) => path.join(root, ...parts);
