import { Dialog as AriaDialog } from 'react-aria-components/Dialog';
import { Heading } from 'react-aria-components/Heading';
import { Modal, ModalOverlay } from 'react-aria-components/Modal';
import type { ReactNode } from 'react';

interface Props {
  title: string;
  isOpen: boolean;
  onClose: () => void;
  /** `alertdialog` where a decision interrupts */
  role?: 'dialog' | 'alertdialog';
  /** as wide as the window allows, for pictures */
  wide?: boolean;
  children: ReactNode;
}

/** A question in front of the page; a sheet from below on phones. */
export function Dialog({ title, isOpen, onClose, role = 'dialog', wide = false, children }: Props) {
  return (
    <ModalOverlay isOpen={isOpen} onOpenChange={(open) => !open && onClose()} isDismissable className="veil">
      <Modal className={wide ? 'raised dialog dialog-wide' : 'raised dialog'}>
        <AriaDialog role={role} className="flex flex-col gap-4 p-6 outline-none">
          <Heading slot="title" className="text-20 font-semibold">
            {title}
          </Heading>
          {children}
        </AriaDialog>
      </Modal>
    </ModalOverlay>
  );
}
