import { createHash } from "node:crypto";
import { escapeHtml } from "./html";
import { money } from "./money";
import { PAY_PAGE_STYLE } from "./pay-page-style";
import type { LineItemRecord, SessionRecord } from "./records";

const STAND_IN_NOTICE =
  "This page is a stand-in for the payment company. It is for trying things out. " +
  "No money moves, and no card is asked for.";

const STYLE_HASH = createHash("sha256").update(PAY_PAGE_STYLE).digest("base64");

/** No script and only the page's own style. No form-action: browsers apply it to the redirect after paying too. */
export const PAY_PAGE_HEADERS = {
  "content-type": "text/html; charset=utf-8",
  "cache-control": "no-store",
  "content-security-policy": [
    "default-src 'none'",
    `style-src 'sha256-${STYLE_HASH}'`,
    "img-src data:",
    "base-uri 'none'",
    "frame-ancestors 'none'",
  ].join("; "),
  "referrer-policy": "no-referrer",
};

/** The page of an open session: what is paid for, how much, and the three answers. */
export function payPage(session: SessionRecord, view: { declined: boolean; minutesLeft: number }): string {
  const amount = money(session.amountTotal, session.currency);
  const heading = `Pay ${amount}`;
  return page({
    title: view.declined ? `Error: payment declined. ${heading}` : heading,
    main: `
      <h1>${escapeHtml(heading)}</h1>
      ${view.declined ? declinedAlert(amount, session.cancelUrl !== null) : ""}
      <h2>What you pay for</h2>
      <ul>${session.lineItems.map((item) => itemLine(item, session.currency)).join("")}</ul>
      <p class="total">Total: <strong>${escapeHtml(amount)}</strong></p>
      ${session.customerEmail === null ? "" : `<p>E-mail: ${escapeHtml(session.customerEmail)}</p>`}
      <p>${timeLeft(view.minutesLeft)}</p>
      <form method="post" action="/pay/${escapeHtml(session.id)}">
        <button class="first" name="answer" value="pay" aria-describedby="pay-hint">Pay ${escapeHtml(amount)}</button>
        <p class="hint" id="pay-hint">The payment works, and you go back to the site.</p>
        <button name="answer" value="decline" aria-describedby="decline-hint">Decline</button>
        <p class="hint" id="decline-hint">The payment fails, as with a card that is refused.</p>
        ${session.cancelUrl === null ? "" : goBackButton()}
      </form>`,
  });
}

export type Ending = { title: string; sentence: string; link: { url: string; text: string } | null };

/** A page that takes no payment and says why, with a way on. */
export function endingPage({ title, sentence, link }: Ending): string {
  const way = link === null ? "" : `<p><a href="${escapeHtml(link.url)}">${escapeHtml(link.text)}</a></p>`;
  return page({ title, main: `<h1>${escapeHtml(title)}</h1><p>${escapeHtml(sentence)}</p>${way}` });
}

function page({ title, main }: { title: string; main: string }): string {
  return `<!doctype html>
<html lang="en">
  <head>
    <meta charset="utf-8">
    <meta name="viewport" content="width=device-width, initial-scale=1">
    <meta name="color-scheme" content="light dark">
    <title>${escapeHtml(title)} – Payment stand-in</title>
    <link rel="icon" href="data:,">
    <style>${PAY_PAGE_STYLE}</style>
  </head>
  <body>
    <main>
      <p class="notice"><strong>Not a real payment.</strong> ${STAND_IN_NOTICE}</p>
      ${main}
    </main>
  </body>
</html>
`;
}

// The focus goes to the alert by itself: a screen reader may not speak an alert that was there as the page loaded.
function declinedAlert(amount: string, hasWayBack: boolean): string {
  const next = hasWayBack ? "You can try again or go back." : "You can try again.";
  return `
      <div class="alert" role="alert" tabindex="-1" autofocus>
        <p><strong>The payment was declined.</strong> The ${escapeHtml(amount)} was not paid. ${next}</p>
      </div>`;
}

function itemLine(item: LineItemRecord, currency: string): string {
  const price = money(item.unitAmount, currency);
  const sum = money(item.unitAmount * item.quantity, currency);
  const amount = item.quantity === 1 ? sum : `${item.quantity} at ${price} each, ${sum} together`;
  const more = item.description === null ? "" : `<br>${escapeHtml(item.description)}`;
  return `<li><strong>${escapeHtml(item.name)}</strong>: ${escapeHtml(amount)}${more}</li>`;
}

function timeLeft(minutes: number): string {
  if (minutes >= 120) return `You can pay here for ${Math.floor(minutes / 60)} hours from now.`;
  return `You can pay here for ${minutes} ${minutes === 1 ? "minute" : "minutes"} from now.`;
}

function goBackButton(): string {
  return `<button name="answer" value="back" aria-describedby="back-hint">Go back</button>
        <p class="hint" id="back-hint">You go back to the site without paying.</p>`;
}
