import { useMutation } from '@tanstack/react-query';
import { call, problemOf } from './api';
import { Button } from './Button';
import { Notice, ProblemNotice } from './Notice';

/** Says that the address is not confirmed yet, and offers to send the mail again. */
export function ConfirmAddress({ email }: { email: string }) {
  const send = useMutation({ mutationFn: () => call('POST /api/account/confirmation', { body: {} }) });
  if (send.isError) return <ProblemNotice problem={problemOf(send.error)} />;
  return (
    <Notice
      kind="warning"
      title="Your address is not confirmed yet."
      detail={`We write to ${email} about your order, so it must be right.`}
      action="Open the link in the mail that we sent you."
    >
      {send.isSuccess ? (
        <p role="status" className="text-15">
          Sent again. Look into your mail.
        </p>
      ) : (
        <Button onPress={() => send.mutate()} isDisabled={send.isPending}>
          Send the mail again
        </Button>
      )}
    </Notice>
  );
}
