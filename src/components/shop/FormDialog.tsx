import type { ReactNode } from 'react';
import { problemOf } from '../api';
import { Button } from '../Button';
import { Dialog } from '../Dialog';
import { ProblemNotice } from '../Notice';

interface Props {
  title: string;
  confirm: string;
  isBusy: boolean;
  error: unknown;
  onSubmit: () => void;
  onClose: () => void;
  children: ReactNode;
}

/** A form in front of a page: fields, a refusal where there is one, and the two ways out. */
export function FormDialog({ title, confirm, isBusy, error, onSubmit, onClose, children }: Props) {
  return (
    <Dialog title={title} isOpen onClose={onClose}>
      <form
        className="flex flex-col gap-4"
        noValidate
        onSubmit={(event) => {
          event.preventDefault();
          onSubmit();
        }}
      >
        {children}
        {error !== null && error !== undefined && <ProblemNotice problem={problemOf(error)} />}
        <div className="flex flex-wrap gap-2">
          <Button type="submit" kind="filled" isDisabled={isBusy}>
            {confirm}
          </Button>
          <Button kind="text" onPress={onClose}>
            Go back
          </Button>
        </div>
      </form>
    </Dialog>
  );
}
