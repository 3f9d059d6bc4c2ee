// The design as a Tailwind theme. Every scale is replaced, not extended, so that no stock colour, corner or shadow can leak in.
import type { Config } from 'tailwindcss';
import plugin from 'tailwindcss/plugin';
import { TOKENS, cssVariables } from './src/styles/tokens';

const colors = Object.fromEntries(Object.keys(TOKENS).map((name) => [name, `var(--${name})`]));

/** A class is named by the design's pixels and sized in rem, so that a larger browser font enlarges the page: `p-14` is 0.875rem. */
const rem = (...px: number[]) => Object.fromEntries(px.map((value) => [String(value), `${value / 16}rem`]));

const text = (sizePx: number, line: number | string): [string, { lineHeight: string }] => [
  `${sizePx / 16}rem`,
  { lineHeight: String(line) },
];

export default {
  content: ['./index.html', './src/**/*.{ts,tsx}'],
  darkMode: ['selector', '[data-theme="dark"]'],
  theme: {
    screens: { tablet: '47.5625rem', desk: '68.8125rem' },
    colors: { transparent: 'transparent', current: 'currentColor', inherit: 'inherit', ...colors },
    spacing: {
      px: '1px',
      ...rem(0, 2, 4, 6, 8, 10, 12, 14, 18, 20, 24, 28, 36, 44, 48, 56, 60, 64, 76, 88, 96, 108),
    },
    borderRadius: { none: '0', cast: '3px', plate: '5px' },
    borderWidth: { DEFAULT: '1px', 0: '0', 1: '1px', 2: '2px', 3: '3px', 5: '5px' },
    boxShadow: { none: 'none' },
    dropShadow: {},
    blur: {},
    backdropBlur: {},
    animation: { none: 'none' },
    keyframes: {},
    backgroundImage: { none: 'none' },
    fontFamily: {
      display: ['"Anybody Variable"', '"Arial Narrow"', 'sans-serif'],
      text: ['"Archivo Variable"', 'Arial', 'sans-serif'],
      code: ['"Martian Mono Variable"', 'ui-monospace', 'monospace'],
      hand: ['"Shantell Sans Variable"', 'cursive'],
    },
    fontSize: {
      hero: text(68, 0.98),
      'hero-phone': text(44, 0.98),
      count: text(56, 0.9),
      h1: text(46, 1.08),
      'h1-tablet': text(38, 1.08),
      'h1-phone': text(34, 1.08),
      h2: text(24, 1.08),
      'h2-phone': text(22, 1.08),
      h3: text(18, 1.2),
      unit: text(20, 1.15),
      'money-28': text(28, 1),
      'money-26': text(26, 1),
      'money-22': text(22, 1.15),
      lead: text(19, 1.45),
      yard: text(18, 1.45),
      body: text(16, 1.5),
      cell: text(15, 1.45),
      small: text(14, 1.45),
      label: text(13, 1.3),
    },
    fontWeight: {
      body: '450',
      link: '560',
      label: '600',
      strong: '680',
      money: '740',
      head: '780',
      hero: '840',
    },
    letterSpacing: { normal: '0', code: '.03em' },
    lineHeight: { none: '1', tight: '1.15', snug: '1.3', body: '1.5' },
    maxWidth: { full: '100%', page: '90rem', read: '66ch', lede: '44ch' },
    transitionDuration: { snap: '120ms', lock: '180ms' },
    transitionTimingFunction: { linear: 'linear', pawl: 'cubic-bezier(.2,.9,.25,1)' },
    zIndex: { 0: '0', 1: '1', 2: '2', 3: '3', 5: '5', 10: '10', 20: '20' },
  },
  plugins: [
    plugin(({ addBase }) => {
      addBase({
        ':root': { 'color-scheme': 'light', ...cssVariables('light') },
        '[data-theme="dark"]': { 'color-scheme': 'dark', ...cssVariables('dark') },
      });
    }),
  ],
} satisfies Config;
