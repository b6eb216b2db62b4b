import type { ReactNode } from 'react';

const paths = {
  find: 'M16.5 10.5a6 6 0 1 1-12 0a6 6 0 1 1 12 0M15 15l5.5 5.5',
  close: 'M6 6l12 12M18 6L6 18',
  plus: 'M12 5v14M5 12h14',
  minus: 'M5 12h14',
  left: 'M14.5 5.5 8 12l6.5 6.5',
  right: 'M9.5 5.5 16 12l-6.5 6.5',
  down: 'M5.5 9.5 12 16l6.5-6.5',
  up: 'M5.5 14.5 12 8l6.5 6.5',
  check: 'M4.5 12.5l5 5L20 6.5',
  camera: 'M3 7.5h4l1.6-2.5h6.8L17 7.5h4V19H3zM15.6 13a3.6 3.6 0 1 1-7.2 0a3.6 3.6 0 1 1 7.2 0',
  notices: 'M4 4h16v13l-3 3H4zM7.5 9h9M7.5 13h6',
  run: 'M6 3v4M6 11v6M8 9a2 2 0 1 1-4 0a2 2 0 1 1 4 0M8 19a2 2 0 1 1-4 0a2 2 0 1 1 4 0M11 9h9M11 19h6',
  calendar: 'M4 4.5H3v15h1M20 4.5h1v15h-1M12 4.5v15M6 9h4M6 13h4M14 11h4M14 15h4',
  lots: 'M4 5l9-1.5 7.5 3L19 20l-8-1L3.5 20zM12 3.7 11 19',
  person: 'M16 8a4 4 0 1 1-8 0a4 4 0 1 1 8 0M4.5 20.5c.6-4.4 3.4-6.5 7.5-6.5s6.9 2.1 7.5 6.5',
  place: 'M12 21c-4.5-5.2-6.5-8.3-6.5-11a6.5 6.5 0 0 1 13 0c0 2.7-2 5.8-6.5 11ZM9.5 10h5M12 7.5v5',
  phone: 'M5 4h4l1.5 5-2.3 1.5c1.2 2.6 2.7 4.1 5.3 5.3L15 13.5l5 1.5v4c0 .6-.4 1-1 1C11 20 4 13 4 5c0-.6.4-1 1-1Z',
  clock: 'M20.5 12a8.5 8.5 0 1 1-17 0a8.5 8.5 0 1 1 17 0M12 7v5.3l3.6 2',
  temperature: 'M10 13.5V5a2 2 0 0 1 4 0v8.5a4.2 4.2 0 1 1-4 0ZM12 9v7',
  'valve-open': 'M3 12h3M18 12h3M6 8v8l12-8v8zM12 12V6M9 6h6',
  'valve-shut': 'M3 12h3M18 12h3M12 12V5M9 3.5v3',
  caution: 'M8.3 3h7.4L21 8.3v7.4L15.7 21H8.3L3 15.7V8.3zM12 7.5v5.5M12 15.5v1.2',
  corrections: 'M12 3.5 21.5 20h-19zM12 10v4.5M12 16.5v.5',
  mail: 'M3 6h18v13H3zM3 7l9 6.5L21 7',
  record: 'M6 3h8l4.5 4.5V21H6zM14 3v5h4.5',
  print: 'M7 8V3.5h10V8M7 17H4V8h16v9h-3M7 14h10v6.5H7z',
  link: 'M9.5 14.5l5-5M8 11l-2.5 2.5a3.5 3.5 0 0 0 5 5L13 16M11 8l2.5-2.5a3.5 3.5 0 0 1 5 5L16 13',
  map: 'M3 6l6-2 6 2 6-2v14l-6 2-6-2-6 2zM9 4v14M15 6v14',
  more: 'M5 11v2M12 11v2M19 11v2',
} as const;

export type IconName = keyof typeof paths;

/** All names, for the page that shows them. */
export const iconNames = Object.keys(paths) as IconName[];

export interface IconProps {
  name: IconName;
  /** In px; drawn on a 24 grid. */
  size?: number;
  /** Read aloud; an icon beside its word needs none. */
  title?: string;
  className?: string;
}

/** A line drawing for an act or a thing, in the colour of the words beside it. */
export function Icon({ name, size = 20, title, className = '' }: IconProps): ReactNode {
  const named = title ? { role: 'img', 'aria-label': title } : { 'aria-hidden': true };
  return (
    <svg
      className={`ic ${className}`}
      width={size}
      height={size}
      viewBox="0 0 24 24"
      fill="none"
      stroke="currentColor"
      strokeWidth={name === 'more' ? 2.6 : 1.7}
      strokeLinecap="square"
      {...named}
    >
      <path d={paths[name]} />
      {name === 'valve-shut' ? <path d="M6 8v8l12-8v8z" fill="currentColor" /> : null}
    </svg>
  );
}
