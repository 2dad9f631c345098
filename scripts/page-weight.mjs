import { gzipSync } from "node:zlib";

/**
 * Addresses of the scripts a page loads at once, each once. Scripts for browsers without modules are
 * left out: no browser that we support loads them.
 *
 * @param {string} html
 * @returns {string[]}
 */
export function scriptsIn(html) {
  const found = new Set();
  for (const [tag] of html.matchAll(/<script\b[^>]*>/gi)) {
    const source = /\ssrc="([^"]+)"/i.exec(tag)?.[1];
    if (source !== undefined && !/\snomodule\b/i.test(tag)) found.add(source.replaceAll("&amp;", "&"));
  }
  return [...found];
}

/**
 * The bytes of script a page makes a browser load, compressed with gzip.
 *
 * @param {string} url
 * @throws if the page or one of its scripts does not answer with 200
 */
export async function scriptWeight(url) {
  const html = new TextDecoder().decode(await load(url));
  const scripts = scriptsIn(html);
  const sizes = await Promise.all(scripts.map(async (each) => gzipSync(await load(new URL(each, url).href)).length));
  return { scripts: scripts.length, bytes: sizes.reduce((sum, size) => sum + size, 0), html };
}

/** @param {string} url */
async function load(url) {
  const response = await fetch(url, { redirect: "error" });
  if (response.status !== 200) throw new Error(`${url} answered ${response.status}`);
  return new Uint8Array(await response.arrayBuffer());
}
