import { useMutation } from '@tanstack/react-query';
import { call, problemOf } from '../api';
import { Button } from '../Button';
import { Island } from '../Island';
import { ProblemNotice } from '../Notice';

/** Confirms with a press, so that a mail program that opens links ahead confirms nothing. */
export default function Confirm({ token, next }: { token: string; next: string }) {
  return (
    <Island>
      <ConfirmButton token={token} next={next} />
    </Island>
  );
}

function ConfirmButton({ token, next }: { token: string; next: string }) {
  const confirm = useMutation({
    mutationFn: () => call('POST /api/account/confirm', { body: { token } }),
    onSuccess: () => window.location.assign(next),
  });
  return (
    <div className="flex flex-col items-start gap-4">
      {confirm.isError && <ProblemNotice problem={problemOf(confirm.error)} />}
      <Button kind="filled" onPress={() => confirm.mutate()} isDisabled={confirm.isPending}>
        Confirm my address
      </Button>
    </div>
  );
}
