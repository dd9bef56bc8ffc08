'use client';

import type { ReactNode } from 'react';
import { Dialog as AriaDialog } from 'react-aria-components/Dialog';
import { Heading } from 'react-aria-components/Heading';
import { Modal, ModalOverlay } from 'react-aria-components/Modal';
import { classNames } from './class-names';

export interface DialogProps {
  open: boolean;
  onOpenChange: (open: boolean) => void;
  title: ReactNode;
  children: ReactNode;
  /** Buttons at the foot; the last is the one to do. */
  actions?: ReactNode;
  wide?: boolean;
  /** A question that must be answered: only a button closes it. */
  asks?: boolean;
}

const overlay = 'fixed inset-0 z-50 bg-veil data-[entering]:animate-appear';

/** A paper label laid over the bench. Focus stays inside, Escape closes, focus goes back to where it came from. */
export function Dialog({ open, onOpenChange, title, children, actions, wide, asks }: DialogProps) {
  return (
    <ModalOverlay
      isOpen={open}
      onOpenChange={onOpenChange}
      isDismissable={!asks}
      isKeyboardDismissDisabled={asks}
      className={classNames(overlay, 'grid place-items-center p-4')}
    >
      <Modal
        className={classNames(
          'max-h-full w-full overflow-auto rounded-tile border border-ink bg-paper text-ink shadow-lift',
          wide ? 'max-w-3xl' : 'max-w-lg',
        )}
      >
        <AriaDialog role={asks ? 'alertdialog' : 'dialog'} className="grid gap-4 p-6 outline-none">
          <Heading slot="title" className="text-title">
            {title}
          </Heading>
          <div className="grid gap-4">{children}</div>
          {actions ? <div className="flex flex-wrap justify-end gap-2 pt-2">{actions}</div> : null}
        </AriaDialog>
      </Modal>
    </ModalOverlay>
  );
}

export interface SheetProps {
  open: boolean;
  onOpenChange: (open: boolean) => void;
  title: ReactNode;
  children: ReactNode;
}

/** From below on a phone, from the right where there is room. */
export function Sheet({ open, onOpenChange, title, children }: SheetProps) {
  return (
    <ModalOverlay isOpen={open} onOpenChange={onOpenChange} isDismissable className={overlay}>
      <Modal
        className={classNames(
          'fixed inset-x-0 bottom-0 max-h-[88dvh] overflow-auto border-t border-ink bg-paper text-ink shadow-lift',
          'md:inset-x-auto md:inset-y-0 md:right-0 md:max-h-none md:w-[27rem] md:border-t-0 md:border-l data-[entering]:animate-rise md:data-[entering]:animate-appear',
        )}
      >
        <AriaDialog className="pb-[env(safe-area-inset-bottom)] outline-none">
          {({ close }) => (
            <>
              <header className="sticky top-0 z-10 flex items-center justify-between gap-3 border-b border-grout bg-paper py-2 pr-2 pl-5">
                <Heading slot="title" className="text-lead">
                  {title}
                </Heading>
                <button
                  type="button"
                  onClick={close}
                  aria-label="Close"
                  className="grid size-10 place-items-center rounded-tile hover:bg-wash"
                >
                  <svg viewBox="0 0 12 12" width="12" height="12" aria-hidden="true">
                    <path d="m1 1 10 10M11 1 1 11" stroke="currentColor" strokeWidth="1.4" />
                  </svg>
                </button>
              </header>
              <div className="grid gap-5 p-5">{children}</div>
            </>
          )}
        </AriaDialog>
      </Modal>
    </ModalOverlay>
  );
}
