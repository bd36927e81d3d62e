/**
 * Outline drawings on a grid of 24, drawn with a line of 1.5 and round ends. Each is one path.
 * A word stands beside a sign wherever the sign carries meaning.
 */
export const ICONS = {
  bottle:
    'M10 2.8h4M10.6 2.8v5.4c0 1-3.1 2-3.1 4.9v6.6c0 .9.7 1.5 1.5 1.5h6c.8 0 1.5-.6 1.5-1.5v-6.6c0-2.9-3.1-3.9-3.1-4.9V2.8M7.5 14.5h9',
  clock: 'M21 12a9 9 0 1 1-18 0a9 9 0 0 1 18 0M12 6.8V12l3.6 2.2',
  jar: 'M7 3h10v3.2H7zM7.8 6.2C6.4 7 5.5 8 5.5 9.6v9c0 1.3 1 2.4 2.4 2.4h8.2c1.4 0 2.4-1.1 2.4-2.4v-9c0-1.6-.9-2.6-2.3-3.4M5.5 12.5h13',
  check: 'M4.5 12.8l4.8 4.9L19.5 6.6',
  forward: 'M4 12h15.5M13.5 6l6 6-6 6',
  up: 'M12 19.5V5M6.5 10.5L12 5l5.5 5.5',
  down: 'M12 4.5V19M6.5 13.5L12 19l5.5-5.5',
  minus: 'M5 12h14',
  plus: 'M5 12h14M12 5v14',
  search: 'M17 10.5a6.5 6.5 0 1 1-13 0a6.5 6.5 0 0 1 13 0M15.4 15.4l5.1 5.1',
  sun: 'M16 12a4 4 0 1 1-8 0a4 4 0 0 1 8 0M12 2.8v2.4M12 18.8v2.4M2.8 12h2.4M18.8 12h2.4M5.5 5.5l1.7 1.7M16.8 16.8l1.7 1.7M5.5 18.5l1.7-1.7M16.8 7.2l1.7-1.7',
  moon: 'M19.8 14.3A8.3 8.3 0 0 1 9.7 4.2a8.3 8.3 0 1 0 10.1 10.1z',
  query:
    'M4 5.5h16v11h-9l-4.5 3.7v-3.7H4zM9.9 9.3c.2-1.1 1-1.7 2.1-1.7 1.2 0 2.1.7 2.1 1.8 0 1.4-2 1.5-2 2.9M12 14.3v.1',
  warning: 'M12 3.6L21.3 20H2.7zM12 10v5M12 17.5v.1',
  egg: 'M12 3c3.6 0 6.3 5.6 6.3 10.1A6.3 6.3 0 0 1 12 21a6.3 6.3 0 0 1-6.3-7.9C5.7 8.6 8.4 3 12 3z',
  pause: 'M8.5 5.5v13M15.5 5.5v13',
  play: 'M7.5 5l11 7-11 7z',
  bell: 'M6 16.5V11a6 6 0 0 1 12 0v5.5l1.5 1.5h-15zM10 20.5h4',
  grip: 'M9 6.5v.1M15 6.5v.1M9 12v.1M15 12v.1M9 17.5v.1M15 17.5v.1',
  close: 'M5.5 5.5l13 13M18.5 5.5l-13 13',
  menu: 'M4 7h16M4 12h16M4 17h16',
  offline:
    'M4 12.5a11.5 11.5 0 0 1 4-3M20 12.5a11.5 11.5 0 0 0-9-3.9M7.5 15.8a6.5 6.5 0 0 1 6.5-1.3M12 19v.1M4 4l16 16',
  pencil: 'M4.5 19.5l1-4.5L16 4.5l3.5 3.5L9 18.5zM13.5 7l3.5 3.5',
  press: 'M5 20.5h14M7 20.5v-5h10v5M12 15.5V9M4 3.5h16v3H4zM8.5 9h7',
  loop: 'M8 7.5h7a4.5 4.5 0 0 1 0 9H6M9 13.5l-3 3 3 3',
  sewing: 'M7 4v16M7 8h6a4 4 0 0 1 0 8H7',
} as const satisfies Record<string, string>;

export type IconName = keyof typeof ICONS;
