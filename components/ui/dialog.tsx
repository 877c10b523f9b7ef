'use client';

import { Dialog as Headless } from 'radix-ui';
import { type ReactNode } from 'react';

import { IconButton } from '@/components/ui/button';
import { Icon } from '@/components/ui/icons';

interface DialogProps {
  open: boolean;
  onOpenChange: (open: boolean) => void;
  title: string;
  description?: string;
  children: ReactNode;
}

function Frame({ open, onOpenChange, title, description, children, className }: DialogProps & { className: string }) {
  return (
    <Headless.Root open={open} onOpenChange={onOpenChange}>
      <Headless.Portal>
        <Headless.Overlay className="fixed inset-0 z-40 bg-[rgb(20_22_26/0.45)]" />
        <Headless.Content {...(description ? {} : { 'aria-describedby': undefined })} className={`fixed z-50 overflow-y-auto border border-thread bg-paper p-5 shadow-float sm:p-6 ${className}`}>
          <div className="mb-4 flex items-start justify-between gap-4">
            <div>
              <Headless.Title className="text-panel">{title}</Headless.Title>
              {description && <Headless.Description className="mt-1 text-table text-ink-soft">{description}</Headless.Description>}
            </div>
            <Headless.Close asChild>
              <IconButton label="Close" className="-mt-1 -mr-1 border-transparent">
                <Icon name="close" />
              </IconButton>
            </Headless.Close>
          </div>
          {children}
        </Headless.Content>
      </Headless.Portal>
    </Headless.Root>
  );
}

/** A question or a form over the page. */
export function Dialog(props: DialogProps) {
  return <Frame {...props} className="top-1/2 left-1/2 max-h-[calc(100dvh-2rem)] w-[min(34rem,calc(100vw-2rem))] -translate-x-1/2 -translate-y-1/2 rounded-sm" />;
}

/** A sheet: from the right on wide screens, from below on narrow ones. */
export function Sheet(props: DialogProps) {
  return <Frame {...props} className="inset-x-0 bottom-0 max-h-[85dvh] sm:inset-x-auto sm:inset-y-0 sm:right-0 sm:max-h-none sm:w-[min(32rem,100vw)]" />;
}
