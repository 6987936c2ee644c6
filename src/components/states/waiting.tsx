/** Lines that are on their way: rules without words, and a word for those who listen. Nothing moves. */
export function WaitingLines({ lines = 4, label = "Loading" }: { lines?: number; label?: string }) {
  return (
    <div role="status">
      <span className="sr-only">{label}</span>
      {Array.from({ length: lines }, (_, index) => (
        <div key={index} aria-hidden="true" className="flex h-line items-center gap-4 border-b">
          <span className="h-2.5 w-10 bg-tint" />
          <span className="h-2.5 w-1/3 bg-tint" />
          <span className="ml-auto h-2.5 w-24 bg-tint" />
        </div>
      ))}
    </div>
  );
}
