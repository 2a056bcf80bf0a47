import type { OrderView } from '@/lib/orders/views';

/** Cautions that apply, each boxed and in full. */
export function CautionList({ cautions }: { cautions: OrderView['cautions'] }) {
  if (cautions.length === 0) return null;
  return (
    <ul aria-label="Cautions" className="flex flex-col gap-2">
      {cautions.map(({ id, title, text }) => (
        <li key={id} className="border border-ink p-4 text-15">
          <strong className="font-semibold">{title}.</strong> {text}
        </li>
      ))}
    </ul>
  );
}
