"use server";

import { attachCheckout } from "@/lib/payments/attach-checkout";
import { chooseFee, type CheckoutWanted } from "@/lib/payments/choose-fee";
import { showCheckout } from "@/lib/payments/show-checkout";
import { gateway } from "@/lib/payments/stripe-gateway";
import { takeCheckoutEvent } from "@/lib/payments/take-checkout-event";
import { confirmNeeds } from "@/lib/registrations/confirm-needs";
import { withdraw } from "@/lib/registrations/withdraw";
import { payments } from "@/lib/shared/actor";
import { signWaiver } from "@/lib/waivers/sign-waiver";
import { formAction, type Next } from "@/lib/web/form-action";
import { systemContext } from "@/lib/web/http-handler";
import { pathTo } from "@/lib/web/paths";

export const confirmNeedsAction = formAction(confirmNeeds, {
  next: ({ registrationId }) => ({ to: pathTo.registration(registrationId) }),
});

export const signWaiverAction = formAction(signWaiver, {
  next: ({ registrationId }) => ({ to: pathTo.registration(registrationId) }),
});

export const chooseFeeAction = formAction(chooseFee, {
  next: async (answer): Promise<Next> => {
    if (answer.kind === "settled") return { to: pathTo.registration(answer.registrationId) };
    if (answer.kind === "open page") return { elsewhere: answer.url };
    if (answer.replacesSession) await gateway().closeCheckout(answer.replacesSession);
    return openPaymentPage(answer.payment);
  },
});

async function openPaymentPage(payment: CheckoutWanted): Promise<Next> {
  const opened = await gateway().openCheckout(payment);
  if (!opened) {
    return {
      refuse: {
        kind: "conflict",
        code: "payments-down",
        sentence: "The payment page cannot be reached just now. Nothing was charged and your seat stays held. Try again in a few minutes, or call us and we settle it together.",
      },
    };
  }
  await attachCheckout(systemContext(payments), { paymentId: payment.id, ...opened });
  return { elsewhere: opened.url };
}

export const askAboutPaymentAction = formAction(showCheckout, {
  next: async ({ sessionId, settled }): Promise<Next> => {
    if (settled) return { say: "The payment has arrived. Thank you." };
    const answer = sessionId ? await gateway().lookUp(sessionId) : "not paid";
    if (answer === null) return { say: "The payment service does not answer just now. Your seat stays held; try again in a few minutes." };
    if (answer === "not paid") return { say: "The payment service has no payment for this seat yet. You can go back to the payment page, or choose again." };
    const taken = await takeCheckoutEvent(systemContext(payments), answer);
    const arrived = taken.ok && (taken.value === "settled" || taken.value === "seen before");
    return { say: arrived ? "The payment has arrived. Thank you." : "A payment has arrived, but not as we expected it. Nothing is lost: call us and we put it right." };
  },
});

export const withdrawAction = formAction(withdraw, {
  next: ({ registrationId }) => ({ to: pathTo.registration(registrationId) }),
});
