import { type SVGProps } from 'react';

/** Our own few signs: 16 units, 1.5 strokes, square ends. Decorative; whoever uses one gives the words. */
const paths = {
  plus: 'M8 3v10M3 8h10',
  minus: 'M3 8h10',
  close: 'M4 4l8 8M12 4l-8 8',
  check: 'M3 8.5l3.2 3.2L13 5',
  search: 'M7 2.8a4.2 4.2 0 1 1 0 8.4 4.2 4.2 0 0 1 0-8.4zM10.2 10.2L13.6 13.6',
  home: 'M2.5 8L8 3l5.5 5M4.3 7v6h7.4V7',
  list: 'M3 4.5h10M3 8h10M3 11.5h10',
  left: 'M10 3L5 8l5 5',
  right: 'M6 3l5 5-5 5',
  up: 'M3.5 10L8 5.5 12.5 10',
  down: 'M3.5 6L8 10.5 12.5 6',
  download: 'M8 2.5v8M4.5 7.5L8 11l3.5-3.5M3 13.5h10',
  upload: 'M8 11V3M4.5 6.5L8 3l3.5 3.5M3 13.5h10',
  warning: 'M8 2.5l6 11H2l6-11zM8 6.5v3.2M8 11.4v.6',
  person: 'M8 3a2.4 2.4 0 1 1 0 4.8A2.4 2.4 0 0 1 8 3zM3 13.5c.4-2.6 2.4-4 5-4s4.6 1.4 5 4',
  pin: 'M6 2.5h4M6.8 2.5l-.6 5-1.7 1.8h7L9.8 7.5l-.6-5M8 9.3v4.2',
} as const;

export type IconName = keyof typeof paths;

export function Icon({ name, size = 16, ...props }: { name: IconName; size?: number } & SVGProps<SVGSVGElement>) {
  return (
    <svg aria-hidden="true" viewBox="0 0 16 16" width={size} height={size} fill="none" stroke="currentColor" strokeWidth={1.5} strokeLinecap="square" {...props}>
      <path d={paths[name]} />
    </svg>
  );
}
