import type { OrderState } from '@/lib/orders/state';
import { LIFE, STATE_WORDS } from './state-words';

interface Props {
  state: OrderState;
  /** state that an order on hold or cancelled had reached last on its straight life */
  reached?: OrderState | null;
}

/** The life of an order on the rule: states as labelled ticks, filled up to where it stands. */
export function LifeRule({ state, reached = null }: Props) {
  const halted = state === 'on-hold' || state === 'cancelled';
  const at = LIFE.indexOf(halted ? (reached ?? 'draft') : state);
  const share = (at / (LIFE.length - 1)) * 100;
  return (
    <div className="flex flex-col gap-1">
      <ol
        className="relative grid text-13 text-quiet"
        style={{ gridTemplateColumns: `repeat(${LIFE.length}, 1fr)` }}
        aria-label="Life of this order"
      >
        <li
          role="presentation"
          aria-hidden="true"
          className="absolute bottom-0 h-px bg-edge"
          style={{ left: '5%', right: '5%' }}
        />
        <li
          role="presentation"
          aria-hidden="true"
          className="absolute bottom-[-1px] h-[3px] bg-ink"
          style={{ left: '5%', width: `${share * 0.9}%` }}
        />
        {LIFE.map((name, index) => (
          <li
            key={name}
            aria-current={index === at ? 'step' : undefined}
            className="flex flex-col items-center justify-end gap-1 text-center leading-tight"
          >
            <span className={`max-md:hidden ${index === at ? 'font-semibold text-ink' : ''}`}>
              {STATE_WORDS[name]}
            </span>
            <span aria-hidden="true" className="flex h-3 items-end">
              <span
                className={`w-px ${index <= at ? 'bg-ink' : 'bg-edge'}`}
                style={{ height: index === at ? 12 : 6 }}
              />
            </span>
          </li>
        ))}
      </ol>
      <p className={`text-15 font-semibold ${halted ? 'text-warning' : 'md:hidden'}`}>
        {STATE_WORDS[state]}
        {halted && reached ? (
          <span className="font-normal text-quiet">, after: {STATE_WORDS[reached].toLowerCase()}</span>
        ) : null}
      </p>
    </div>
  );
}
