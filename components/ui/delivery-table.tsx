import { DataTable } from "@/components/ui/data-table";
import { messageKindInWords, type DeliveryView } from "@/lib/messages/message";
import { counted } from "@/lib/shared/words";
import { momentInWords } from "@/lib/shared/dates";

const states = { queued: "waiting to be sent", sending: "being sent", sent: "sent", failed: "given up", cancelled: "cancelled" };

export function DeliveryTable({ deliveries, zone, caption }: { deliveries: DeliveryView[]; zone: string; caption: string }) {
  if (deliveries.length === 0) return <p className="mt-4">No mails.</p>;
  return (
    <DataTable
      caption={caption}
      columns={["To", "What", "State", "When"]}
      rows={deliveries.map((one) => ({
        key: one.id,
        name: one.toAddress,
        cells: [<Contents key="what" delivery={one} />, <State key="state" delivery={one} />, momentInWords(one.sentAt ?? one.createdAt, zone)],
      }))}
    />
  );
}

function Contents({ delivery }: { delivery: DeliveryView }) {
  const what = delivery.subject ?? messageKindInWords[delivery.kind];
  if (!delivery.textBody) return what;
  return (
    <details>
      <summary className="py-0! min-h-0!">{what}</summary>
      <p className="whitespace-pre-wrap py-3">{delivery.textBody}</p>
    </details>
  );
}

function State({ delivery }: { delivery: DeliveryView }) {
  return (
    <>
      <strong>{states[delivery.state]}</strong>
      {delivery.lastProblem && <span className="block">Tried {counted(delivery.attempts, "time", "times")}. {delivery.lastProblem}</span>}
    </>
  );
}
