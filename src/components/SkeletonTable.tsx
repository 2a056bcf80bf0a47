interface Props {
  rows?: number;
  columns: number;
  /** what is being fetched, such as "Fetching orders" */
  words: string;
}

/** Placeholder of a table while it is fetched. Nothing moves. */
export function SkeletonTable({ rows = 5, columns, words }: Props) {
  return (
    <div role="status" className="flex flex-col">
      <span className="hidden-words">{words}</span>
      {Array.from({ length: rows }, (_, row) => (
        <div
          key={row}
          aria-hidden="true"
          className="grid gap-6 border-b border-hair py-4"
          style={{ gridTemplateColumns: `repeat(${columns}, 1fr)` }}
        >
          {Array.from({ length: columns }, (_, column) => (
            <span
              key={column}
              className="h-4 bg-hair"
              style={{ width: `${55 + ((row * 3 + column * 5) % 4) * 12}%` }}
            />
          ))}
        </div>
      ))}
    </div>
  );
}
