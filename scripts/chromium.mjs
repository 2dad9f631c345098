import { CannotGoOn } from "./cannot-go-on.mjs";
import { findProgram, installDebianPackages, isProgramFile } from "./programs.mjs";

/** @typedef {import("./processes.mjs").Processes} Processes */

const BROWSERS = ["chromium", "chromium-browser", "google-chrome"];

/** Programs the tests read PDF files with, and the Debian package each comes in. */
const PDF_PROGRAMS = { pdfinfo: "poppler-utils", pdftotext: "poppler-utils", qpdf: "qpdf" };

/** The browser for the end-to-end tests: CHROMIUM_PATH, or one on the PATH, or null. */
export function findChromium(env = process.env) {
  const chosen = env.CHROMIUM_PATH;
  if (chosen) return isProgramFile(chosen) ? chosen : null;
  for (const name of BROWSERS) {
    const found = findProgram(name, env.PATH);
    if (found !== null) return found;
  }
  return null;
}

/**
 * Finds the browser and the PDF programs of the tests, and installs what is missing where that is
 * allowed.
 *
 * @param {Processes} processes
 * @returns {Promise<string>} the browser
 */
export async function ensureTestPrograms(processes) {
  const before = missingPackages();
  if (before.length > 0) await installDebianPackages(processes, before);
  const chromium = findChromium();
  const missing = missingPackages();
  if (chromium === null || missing.length > 0) throw new CannotGoOn(adviceFor(missing));
  const { ok, lastLines } = await processes.run({
    name: "chromium",
    command: chromium,
    args: ["--version"],
    output: "kept",
  });
  if (ok) return chromium;
  throw new CannotGoOn(`${chromium} does not start:\n${lastLines}\nSet CHROMIUM_PATH to a Chromium that does.`);
}

/** Debian packages that would bring what is not there. */
function missingPackages() {
  const pdf = Object.entries(PDF_PROGRAMS).filter(([program]) => findProgram(program) === null);
  const packages = pdf.map(([, debianPackage]) => debianPackage);
  const needsBrowser = !process.env.CHROMIUM_PATH && findChromium() === null;
  return [...new Set(needsBrowser ? ["chromium", ...packages] : packages)];
}

/** @param {readonly string[]} packages */
function adviceFor(packages) {
  if (packages.length === 0) return `CHROMIUM_PATH is "${process.env.CHROMIUM_PATH}", which is not a program.`;
  return `The tests need ${packages.join(", ")}. On Debian: apt-get install -y ${packages.join(" ")}`;
}
