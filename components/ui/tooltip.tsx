'use client';

import { Tooltip as Headless } from 'radix-ui';
import { type ReactNode } from 'react';

/** Words that help but are never needed: touch screens do not show them. The child is one focusable element. */
export function Tooltip({ text, children }: { text: string; children: ReactNode }) {
  return (
    <Headless.Provider delayDuration={350}>
      <Headless.Root>
        <Headless.Trigger asChild>{children}</Headless.Trigger>
        <Headless.Content sideOffset={6} collisionPadding={8} className="z-50 max-w-64 rounded-xs bg-ink px-2.5 py-1.5 text-small text-paper shadow-float">
          {text}
        </Headless.Content>
      </Headless.Root>
    </Headless.Provider>
  );
}
