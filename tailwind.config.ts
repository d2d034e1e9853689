import type { Config } from 'tailwindcss';

/**
 * The tokens of the design. Paper is what is known, film is what is done now, straw asks for another look,
 * madder holds or fails. Every text pair in use has a contrast of 4.5 or more, every line that carries meaning
 * 3 or more (WCAG 2.2, success criteria 1.4.3 and 1.4.11); tests/client/ui/tokens.test.ts measures them.
 */
export const colors = {
  paper: { 0: '#FCFAF5', 1: '#F5F1E8', 2: '#EBE4D5', 3: '#D6CAB1', edge: '#83693C' },
  ink: { 1: '#1A2528', 2: '#3F4C4F', 3: '#566164' },
  film: { 0: '#EAF3F1', 1: '#D5E8E5', 2: '#A6CFCB', 3: '#35787F', 4: '#105A64', 5: '#0A4048' },
  straw: { 1: '#F7E8C3', 2: '#DDB352', 3: '#7A5000' },
  madder: { 1: '#F9E0DA', 3: '#A1281C', 4: '#781A11' },
  leaf: { paper: '#E3CB98', film: '#8EC6C4' },
} as const;

/** Size and line in rem of a 16 px root, so that a larger text setting of the browser is followed. */
function step(sizePx: number, linePx: number, fontWeight: number, letterSpacing = '0') {
  const token: [string, { lineHeight: string; fontWeight: string; letterSpacing: string }] = [
    `${sizePx / 16}rem`,
    { lineHeight: `${linePx / 16}rem`, fontWeight: String(fontWeight), letterSpacing },
  ];
  return token;
}

const config: Config = {
  content: ['./index.html', './src/**/*.{ts,tsx}'],
  theme: {
    colors: { inherit: 'inherit', transparent: 'transparent', current: 'currentColor', ...colors },
    screens: { tablet: '700px', desk: '1400px', wide: '1800px' },
    borderRadius: { none: '0', DEFAULT: '3px', full: '9999px' },
    fontSize: {
      place: step(40, 46, 640, '-0.028em'),
      scan: step(36, 42, 580, '-0.024em'),
      clock: step(34, 38, 600),
      title: step(28, 34, 560, '-0.018em'),
      say: step(21, 27, 560, '-0.012em'),
      head: step(17, 22, 620, '-0.008em'),
      body: step(15, 20, 400),
      row: step(14, 20, 400),
      small: step(13, 18, 400),
      least: step(12, 16, 450),
    },
    fontWeight: { normal: '400', medium: '500', semibold: '600', label: '620', bold: '680' },
    extend: {
      fontFamily: { sans: ['"Inter Variable"', 'system-ui', 'sans-serif'] },
      boxShadow: {
        film: '0 1px 0 rgb(255 255 255 / .7) inset, 0 1px 2px rgb(10 64 72 / .10), 0 6px 18px -10px rgb(10 64 72 / .28)',
        sheet: '0 2px 6px rgb(26 37 40 / .18), 0 24px 60px -12px rgb(26 37 40 / .45)',
      },
    },
  },
};

export default config;
