"use server";

import { sendMeetingPoint } from "@/lib/helpers/send-meeting-point";
import { retryDeliveries } from "@/lib/messages/retry-deliveries";
import { returnPayment } from "@/lib/payments/return-payment";
import { formAction } from "@/lib/web/form-action";

export const retryDeliveriesAction = formAction(retryDeliveries, {
  next: ({ messages }) => ({ say: messages === 1 ? "One mail is being sent again." : `${messages} mails are being sent again.` }),
});

export const returnPaymentAction = formAction(returnPayment, {
  next: () => ({ say: "Noted." }),
});

export const sendMeetingPointAction = formAction(sendMeetingPoint, {
  next: ({ people }) => ({ say: `The meeting point goes to ${people === 1 ? "one adult" : `${people} adults`}, one mail each. Who has had this very text already does not get it again.` }),
});
