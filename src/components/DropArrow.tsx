/** Points down: a list opens here. Drawn, because the shipped fonts have no arrows. */
export function DropArrow() {
  return (
    <svg width="12" height="8" viewBox="0 0 12 8" aria-hidden="true" className="flex-none text-action">
      <path d="M1 1.5 6 6.5 11 1.5" fill="none" stroke="currentColor" strokeWidth="1.5" />
    </svg>
  );
}
