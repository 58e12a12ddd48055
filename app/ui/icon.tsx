const paths = {
  camera: 'M3 8.5h4l1.6-2.5h6.8L17 8.5h4V19H3zM12 9.8a3.6 3.6 0 1 0 0 7.2 3.6 3.6 0 0 0 0-7.2z',
  search: 'M10.5 4.5a6 6 0 1 0 0 12 6 6 0 0 0 0-12zM15 15l5.5 5.5',
  plus: 'M12 4.5v15M4.5 12h15',
  minus: 'M4.5 12h15',
  down: 'm5 9 7 7 7-7',
  right: 'm9 5 7 7-7 7',
  left: 'm15 5-7 7 7 7',
  menu: 'M4 7h16M4 12h16M4 17h16',
  note: 'M5 3.5h14v17H5zM8.5 8.5h7M8.5 12h7M8.5 15.5h4',
  rest: 'M4 3.5h16M4 20.5h16M6.5 3.5c0 5 4.5 6 4.5 8.5s-4.5 3.5-4.5 8.5M17.5 3.5c0 5-4.5 6-4.5 8.5s4.5 3.5 4.5 8.5',
  rule: 'M2.5 8.5h19v7h-19zM6.5 8.5v3M10.5 8.5V13M14.5 8.5v3M18.5 8.5V13',
  pot: 'M5 9h14l-1.5 11h-11zM3.5 9h17M15 9l4-6',
  tray: 'M3 5.5h18v13H3zM9 5.5v13M15 5.5v13M3 12h12',
  print: 'M7 8.5v-5h10v5M7 17H3.5V8.5h17V17H17M7 14h10v6.5H7z',
  file: 'M6 3h8l4.5 4.5V21H6zM14 3v5h4.5',
  close: 'm5 5 14 14M19 5 5 19',
  up: 'M12 20V5M5.5 11 12 4.5l6.5 6.5',
  off: 'M3 9.5a13 13 0 0 1 18 0M6.5 13.5a8 8 0 0 1 11 0M12 18.5v.01M4 3l16 18',
  key: 'M8 11a4.5 4.5 0 1 0 0 9 4.5 4.5 0 0 0 0-9zM11.3 12.2 19.5 4M16 7.5l3 3',
  pin: 'M12 3.5a8.5 8.5 0 1 0 0 17 8.5 8.5 0 0 0 0-17zM10.3 9.6l2-1.4v7.6',
  retry: 'M20 12a8 8 0 1 1-2.3-5.6M20 3.5V8h-4.5',
  clock: 'M12 3.5a8.5 8.5 0 1 0 0 17 8.5 8.5 0 0 0 0-17zM12 7.5V12l3 2',
} as const;

export type IconName = keyof typeof paths;

/** A line drawing beside words; never alone without an accessible name on its control. */
export function Icon({ name, size = 20 }: { name: IconName; size?: number }) {
  return (
    <svg
      viewBox="0 0 24 24"
      width={size}
      height={size}
      fill="none"
      stroke="currentColor"
      strokeWidth={1.6}
      strokeLinecap="round"
      strokeLinejoin="round"
      aria-hidden
    >
      <path d={paths[name]} />
    </svg>
  );
}
