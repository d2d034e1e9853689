import type { ReactNode } from 'react';
import { Dialog as AriaDialog, Heading, Modal, ModalOverlay } from 'react-aria-components';
import { Icon } from '../icon';
import { Button } from './button';

export type DialogProps = {
  isOpen: boolean;
  /** Escape, a touch beside it, or the cross. Without it the dialog stays until its own buttons end it. */
  onClose?: (() => void) | undefined;
  title: string;
  children: ReactNode;
  /** The buttons at its foot; the main one first. */
  actions?: ReactNode;
  size?: 'normal' | 'wide' | 'full';
  /** paper: something to read or fill in. film: something to do now. */
  material?: 'paper' | 'film';
  role?: 'dialog' | 'alertdialog';
};

const widths = { normal: 'tablet:max-w-[33rem]', wide: 'tablet:max-w-[52rem]', full: 'tablet:max-w-[78rem]' } as const;

/** A sheet over the screen. The screen below keeps all it has. On the phone it rises from the foot. */
export function Dialog({
  isOpen,
  onClose,
  title,
  children,
  actions,
  size = 'normal',
  material = 'paper',
  role = 'dialog',
}: DialogProps) {
  const isDismissable = onClose !== undefined;
  return (
    <ModalOverlay
      isOpen={isOpen}
      onOpenChange={(next) => {
        if (!next) onClose?.();
      }}
      isDismissable={isDismissable}
      isKeyboardDismissDisabled={!isDismissable}
      className="fixed inset-0 z-40 grid items-end justify-items-center bg-ink-1/45 tablet:items-center tablet:p-6"
    >
      <Modal
        className={`flex max-h-[94dvh] w-full flex-col overflow-hidden shadow-sheet ${widths[size]} ${material === 'film' ? 'bg-film' : 'bg-paper-0'}`}
      >
        <AriaDialog role={role} className="seal-t flex min-h-0 flex-col outline-none">
          <header className="flex items-start justify-between gap-4 px-6 pt-6">
            <Heading slot="title" className="text-title">
              {title}
            </Heading>
            {isDismissable && (
              <Button kind="plain" aria-label="Close" className="-mt-1.5 -mr-3 w-12" onPress={onClose}>
                <Icon name="cross" />
              </Button>
            )}
          </header>
          <div className="min-h-0 overflow-auto px-6 pt-2 pb-6">{children}</div>
          {actions !== undefined && (
            <footer className="flex flex-wrap gap-2.5 border-t border-paper-3 px-6 py-4">{actions}</footer>
          )}
        </AriaDialog>
      </Modal>
    </ModalOverlay>
  );
}
