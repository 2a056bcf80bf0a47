import { Button } from '../Button';

interface Props {
  page: number;
  perPage: number;
  total: number;
  onPage: (page: number) => void;
}

/** "1 to 25 of 130 orders", and the way to the next ones. */
export function Pages({ page, perPage, total, onPage }: Props) {
  const last = Math.max(1, Math.ceil(total / perPage));
  const first = (page - 1) * perPage + 1;
  const until = Math.min(total, page * perPage);
  return (
    <nav aria-label="Pages" className="flex flex-wrap items-center gap-4 pt-4 text-15">
      <p role="status">
        {first > total
          ? `Past the end: ${total} in all`
          : `${first.toLocaleString('en-GB')} to ${until.toLocaleString('en-GB')} of ${total.toLocaleString('en-GB')}`}
      </p>
      {last > 1 && (
        <>
          <Button onPress={() => onPage(page - 1)} isDisabled={page <= 1}>
            Earlier page
          </Button>
          <Button onPress={() => onPage(page + 1)} isDisabled={page >= last}>
            Next page
          </Button>
          <span className="text-quiet">
            Page {page} of {last}
          </span>
        </>
      )}
    </nav>
  );
}
