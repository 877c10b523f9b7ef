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
  sort: 'M5 3v10M2.5 10.5L5 13l2.5-2.5M11 13V3M8.5 5.5L11 3l2.5 2.5',
  columns: 'M2.5 3h11v10h-11zM6.2 3v10M9.8 3v10',
  undo: 'M5.5 3L2.5 6l3 3M2.8 6H10a3.5 3.5 0 0 1 0 7H6',
  link: 'M6.5 9.5l3-3M7 4.8l1.4-1.4a2.9 2.9 0 0 1 4.2 4.2L11.2 9M9 11.2l-1.4 1.4a2.9 2.9 0 0 1-4.2-4.2L4.8 7',
  light: 'M8 5.2a2.8 2.8 0 1 1 0 5.6 2.8 2.8 0 0 1 0-5.6zM8 1.5v1M8 13.5v1M1.5 8h1M13.5 8h1M3.4 3.4l.7.7M11.9 11.9l.7.7M12.6 3.4l-.7.7M4.1 11.9l-.7.7',
  dark: 'M13 9.6A5.5 5.5 0 0 1 6.4 3a5.5 5.5 0 1 0 6.6 6.6z',
} as const;

export type IconName = keyof typeof paths;

export function Icon({ name, size = 16, ...props }: { name: IconName; size?: number } & SVGProps<SVGSVGElement>) {
  return (
    <svg aria-hidden="true" viewBox="0 0 16 16" width={size} height={size} fill="none" stroke="currentColor" strokeWidth={1.5} strokeLinecap="square" {...props}>
      <path d={paths[name]} />
    </svg>
  );
}
