import type { ReactNode } from 'react';
import { Dialog, Heading, Modal, ModalOverlay } from 'react-aria-components';
import { Icon } from './icons.tsx';

export interface SheetDialogProps {
  readonly title: string;
  readonly onClose: () => void;
  readonly children: ReactNode;
  /** Buttons at the foot. */
  readonly foot?: ReactNode;
}

/** A sheet laid over the bench; Escape and the ground beside it close it. Loaded with the dialog it carries. */
export function SheetDialog({ title, onClose, children, foot }: SheetDialogProps) {
  return (
    <ModalOverlay className="dialog-ground" isOpen isDismissable onOpenChange={(open) => !open && onClose()}>
      <Modal className="dialog-sheet">
        <Dialog className="dialog">
          <div className="dialog-head">
            <Heading slot="title">{title}</Heading>
            <button type="button" className="button-icon" aria-label="Close" onClick={onClose}>
              <Icon name="close" />
            </button>
          </div>
          {/* biome-ignore lint/a11y/noNoninteractiveTabindex: it scrolls, and must scroll by keys too */}
          <div className="dialog-body" tabIndex={0}>
            {children}
          </div>
          {foot && <div className="dialog-foot">{foot}</div>}
        </Dialog>
      </Modal>
    </ModalOverlay>
  );
}
