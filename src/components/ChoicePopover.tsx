import { Button } from 'react-aria-components/Button';
import { Dialog, DialogTrigger } from 'react-aria-components/Dialog';
import { Heading } from 'react-aria-components/Heading';
import { Modal, ModalOverlay } from 'react-aria-components/Modal';
import { Popover } from 'react-aria-components/Popover';
import type { ReactNode } from 'react';
import { useNarrow } from './use-narrow';

interface Props {
  /** the underlined word, as part of a sentence */
  word: ReactNode;
  /** what the word chooses, such as "Line pitch" */
  title: string;
  children: ReactNode | ((close: () => void) => ReactNode);
  isDisabled?: boolean;
}

/** A word of a sentence that opens its own choice: a popover, at 360 px a sheet from below. */
export function ChoicePopover({ word, title, children, isDisabled }: Props) {
  const narrow = useNarrow();
  const content = (
    <Dialog className="flex flex-col gap-4 p-4 outline-none">
      {({ close }) => (
        <>
          <Heading slot="title" className="text-15 font-semibold">
            {title}
          </Heading>
          {typeof children === 'function' ? children(close) : children}
        </>
      )}
    </Dialog>
  );
  return (
    <DialogTrigger>
      <Button
        isDisabled={isDisabled}
        className="link cursor-pointer font-semibold disabled:cursor-default disabled:no-underline"
        aria-label={typeof word === 'string' ? `${word}: change ${title.toLowerCase()}` : undefined}
      >
        {word}
      </Button>
      {narrow ? (
        <ModalOverlay isDismissable className="veil veil-sheet">
          <Modal className="raised sheet">{content}</Modal>
        </ModalOverlay>
      ) : (
        <Popover
          // Inside the page's main part, so that what it holds belongs to a landmark.
          UNSTABLE_portalContainer={globalThis.document?.querySelector('main') ?? undefined}
          className="raised w-[360px] max-w-[92vw] overflow-auto"
          placement="bottom start"
          offset={6}
        >
          {content}
        </Popover>
      )}
    </DialogTrigger>
  );
}
