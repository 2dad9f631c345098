import { messageKindInWords } from "@/lib/messages/message";
import type { DeliveryView } from "@/lib/messages/message-store";
import { momentInWords } from "@/lib/shared/dates";

const states = { queued: "Waiting to be sent", sending: "Being sent", sent: "Sent", failed: "Given up", cancelled: "Cancelled" };

export function DeliveryTable({ deliveries, zone, caption }: { deliveries: DeliveryView[]; zone: string; caption: string }) {
  if (deliveries.length === 0) return <p className="mt-4">No mails.</p>;
  return (
    <div className="scroll-x mt-4" role="region" aria-label={caption} tabIndex={0}>
      <table>
        <caption>{caption}</caption>
        <thead>
          <tr>
            <th scope="col">To</th>
            <th scope="col">What</th>
            <th scope="col">State</th>
            <th scope="col">When</th>
          </tr>
        </thead>
        <tbody>
          {deliveries.map((one) => (
            <tr key={one.id}>
              <th scope="row">{one.toAddress}</th>
              <td>
                {one.textBody ? (
                  <details>
                    <summary>{one.subject ?? messageKindInWords[one.kind]}</summary>
                    <p className="whitespace-pre-wrap py-3">{one.textBody}</p>
                  </details>
                ) : (
                  messageKindInWords[one.kind]
                )}
              </td>
              <td>
                <strong>{states[one.state]}</strong>
                {one.lastProblem && <span className="block">Tried {one.attempts} times. {one.lastProblem}</span>}
              </td>
              <td>{momentInWords(one.sentAt ?? one.createdAt, zone)}</td>
            </tr>
          ))}
        </tbody>
      </table>
    </div>
  );
}
