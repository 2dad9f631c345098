/** What became of the last form, said once, politely. The region is there, empty, from the start. */
export function DoneMessage({ sentence }: { sentence: string }) {
  return (
    <div role="status">
      {sentence !== "" && (
        <div className="slab good my-6">
          <p className="font-bold">{sentence}</p>
        </div>
      )}
    </div>
  );
}
