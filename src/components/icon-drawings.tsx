import type { ReactNode } from 'react';

/** Our own drawings: a 24 grid, 1.75 stroke, square ends. Each always goes with a word. */
export const iconDrawings = {
  today: (
    <>
      <path d="M3 6h18M3 12h18M3 18h18" strokeOpacity=".45" />
      <path d="M4 6h7M9 12h8M14 18h6" strokeWidth="3.4" />
    </>
  ),
  load: (
    <>
      <path d="M4 4v13M20 4v13M4 10h16M4 17h16M7 20.5h.01M17 20.5h.01" />
      <path d="M7.5 10V5M10.5 10V5M13.5 10V5" strokeWidth="2.2" />
      <path d="M7 14h8v3H7z" />
    </>
  ),
  release: (
    <>
      <path d="M3 8h18v8H3z" />
      <path d="M7 8v8M10 8v8M13 8v8M16 8v8" strokeWidth="1.2" />
      <path d="M3 4.5h18M3 19.5h18" strokeDasharray="3 2" />
    </>
  ),
  recall: (
    <>
      <path d="M20 12H6" />
      <path d="m10 7-5 5 5 5" />
      <path d="M20 5v14" />
    </>
  ),
  practice: (
    <>
      <path d="M3 7.5h18M3 17h18" strokeDasharray="2.5 2" />
      <path d="m3.5 13 4-2.5 4 3 4-5.5 5 2.5" />
    </>
  ),
  find: (
    <>
      <path d="M4 4h5M4 4v5M20 4h-5M20 4v5M4 20h5M4 20v-5M20 20h-5M20 20v-5" />
      <path d="M8 8v8M11 8v8M14 8v8M16.5 8v8" strokeWidth="1.6" />
    </>
  ),
  tick: (
    <>
      <path d="m4.5 12.5 5 5 10-11" strokeWidth="2.6" />
    </>
  ),
  cross: (
    <>
      <path d="m6 6 12 12M18 6 6 18" strokeWidth="2.6" />
    </>
  ),
  wait: (
    <>
      <path d="M6 3h12M6 21h12M7 3c0 5 10 13 10 18M17 3c0 5-10 13-10 18" />
    </>
  ),
  lock: (
    <>
      <path d="M5 11h14v9H5z" />
      <path d="M8 11V8a4 4 0 0 1 8 0v3" />
    </>
  ),
  scan: (
    <>
      <path d="M4 5v14M7.5 5v14M10 5v14M14 5v14M16 5v14M20 5v14" strokeWidth="1.7" />
    </>
  ),
  sound: (
    <>
      <path d="M4 9.5h4l5-4v13l-5-4H4z" />
      <path d="M16.5 9a4 4 0 0 1 0 6M19 6.5a8 8 0 0 1 0 11" />
    </>
  ),
  right: (
    <>
      <path d="M4 12h15M13 6l6 6-6 6" />
    </>
  ),
  left: (
    <>
      <path d="M20 12H5M11 6l-6 6 6 6" />
    </>
  ),
  pouch: (
    <>
      <path d="M5 3h14v18H5z" />
      <path d="m5 7 7-2.5L19 7" />
      <path d="M5 18h14" strokeDasharray="1.2 1.6" />
    </>
  ),
  box: (
    <>
      <path d="M3 8h18v11H3z" />
      <path d="M2 5h20v3H2z" />
      <path d="M7 6.5h.01M9 6.5h.01M15 6.5h.01M17 6.5h.01" strokeWidth="1.5" />
    </>
  ),
  tray: (
    <>
      <path d="M3 6h18v12H3z" />
      <path d="m3 6 9 7 9-7M3 18l6-6M21 18l-6-6" strokeWidth="1.3" />
    </>
  ),
  textile: (
    <>
      <path d="M4 8c2-2 14-2 16 0M4 12c2-2 14-2 16 0M4 16c2-2 14-2 16 0M4 8v10h16V8" />
    </>
  ),
  basin: (
    <>
      <path d="M3 8h18c0 6-4 10-9 10S3 14 3 8z" />
      <path d="M7.5 8c0 3.5 1.8 5.8 4.5 5.8s4.5-2.3 4.5-5.8" strokeWidth="1.3" />
    </>
  ),
  challenge: (
    <>
      <path d="M3 6h18v12H3z" />
      <path d="M6.5 9.5h11v5h-11z" fill="currentColor" stroke="none" />
    </>
  ),
  implant: (
    <>
      <path d="M12 2.5 21 12l-9 9.5L3 12z" />
      <path d="M12 7.5v9M9.5 9.5h5M9.5 14.5h5" strokeWidth="1.4" />
    </>
  ),
  drop: (
    <>
      <path d="M12 3c4 5 6 8 6 11a6 6 0 0 1-12 0c0-3 2-6 6-11z" />
    </>
  ),
  letter: (
    <>
      <path d="M3 5.5h18v13H3z" />
      <path d="m3 6 9 7 9-7" />
    </>
  ),
  print: (
    <>
      <path d="M6 9V3.5h12V9M4 9h16v8h-3M7 17H4V9" />
      <path d="M7 14h10v6.5H7z" />
    </>
  ),
  person: (
    <>
      <path d="M12 12a4 4 0 1 0 0-8 4 4 0 0 0 0 8zM4 21c0-4 3.5-6 8-6s8 2 8 6" />
    </>
  ),
  off: (
    <>
      <path d="M4 4l16 16M2.5 9.5C5 7 8 5.6 11 5.4M21.5 9.5c-1.6-1.6-3.4-2.7-5.3-3.4M6 13c1.2-1.2 2.6-2 4-2.4M18 13c-.6-.6-1.3-1.1-2-1.5M12 18h.01" />
    </>
  ),
  more: (
    <>
      <path d="M5 12h.01M12 12h.01M19 12h.01" strokeWidth="3" />
    </>
  ),
  turn: (
    <>
      <path d="M4 12a8 8 0 0 1 14-5l2 2M20 4v5h-5" />
      <path d="M20 12a8 8 0 0 1-14 5l-2-2M4 20v-5h5" />
    </>
  ),
  pack: (
    <>
      <path d="M5 8v13h14V8" />
      <path d="m5 8 3-5h8l3 5" />
      <path d="M12 6v9M8.5 11.5 12 15l3.5-3.5" />
    </>
  ),
  stock: (
    <>
      <path d="M4 3v18M20 3v18M4 9h16M4 15h16M4 21h16" />
      <path d="M8 9V5.5M11 9V4.5M15 15v-3h-4v3" strokeWidth="2" />
    </>
  ),
  policy: (
    <>
      <path d="M2.5 8h19v8h-19z" />
      <path d="M6.5 8v3M10.25 8v4.5M14 8v3M17.75 8v4.5" />
    </>
  ),
  people: (
    <>
      <path d="M9 11a3.5 3.5 0 1 0 0-7 3.5 3.5 0 0 0 0 7zM2.5 20c0-3.5 3-5.5 6.5-5.5s6.5 2 6.5 5.5" />
      <path d="M16 4.4a3.5 3.5 0 0 1 0 6.4M17.5 14.8c2.4.7 4 2.5 4 5.2" />
    </>
  ),
  soundOff: (
    <>
      <path d="M4 9.5h4l5-4v13l-5-4H4z" />
      <path d="m17 9.5 5 5M22 9.5l-5 5" />
    </>
  ),
  search: (
    <>
      <path d="M10.5 17a6.5 6.5 0 1 0 0-13 6.5 6.5 0 0 0 0 13zM15.5 15.5 21 21" />
    </>
  ),
  plus: (
    <>
      <path d="M12 5v14M5 12h14" />
    </>
  ),
  minus: (
    <>
      <path d="M5 12h14" />
    </>
  ),
  camera: (
    <>
      <path d="M3 7h4l2-3h6l2 3h4v13H3z" />
      <path d="M12 17a4 4 0 1 0 0-8 4 4 0 0 0 0 8z" />
    </>
  ),
  down: (
    <>
      <path d="m6 9.5 6 6 6-6" />
    </>
  ),
  up: (
    <>
      <path d="m6 14.5 6-6 6 6" />
    </>
  ),
  back: (
    <>
      <path d="M8 5h13v14H8l-6-7z" />
      <path d="m11.5 9 6 6M17.5 9l-6 6" />
    </>
  ),
  undo: (
    <>
      <path d="M4 9h10a5.5 5.5 0 0 1 0 11H9" />
      <path d="M8.5 4.5 4 9l4.5 4.5" />
    </>
  ),
  eye: (
    <>
      <path d="M2.5 12C5 8 8.3 6 12 6s7 2 9.5 6c-2.5 4-5.8 6-9.5 6s-7-2-9.5-6z" />
      <path d="M12 14.5a2.5 2.5 0 1 0 0-5 2.5 2.5 0 0 0 0 5z" />
    </>
  ),
  file: (
    <>
      <path d="M5 3h9l5 5v13H5z" />
      <path d="M14 3v5h5M8.5 13h7M8.5 17h7" />
    </>
  ),
  edit: (
    <>
      <path d="M4 20v-4L16 4l4 4L8 20z" />
      <path d="m13 7 4 4" />
    </>
  ),
  out: (
    <>
      <path d="M14 4H5v16h9" />
      <path d="M10 12h11M17 7.5l4.5 4.5-4.5 4.5" />
    </>
  ),
  warn: (
    <>
      <path d="M12 3 22 20.5H2z" />
      <path d="M12 10v5M12 17.8h.01" strokeWidth="2" />
    </>
  ),
  keys: (
    <>
      <path d="M4 7h16v10H4z" />
      <path d="M7 11h.01M10.3 11h.01M13.6 11h.01M17 11h.01M8 14h8" strokeWidth="2" />
    </>
  ),
} as const satisfies Record<string, ReactNode>;

export type IconName = keyof typeof iconDrawings;
