// The colours of the product, once: the Tailwind theme, the CSS variables and the contrast test are all made from this table.

interface Token {
  readonly light: `#${string}`;
  readonly dark: `#${string}`;
}

/**
 * sRGB hex for each theme. Text in red, green, amber or blue takes the `-ink` token; the plain one is for fills and marks.
 * `line` and `plate-edge` are decoration only (below 3:1), so a control's edge is `line-2` or `ink`.
 */
export const TOKENS = {
  /** Page ground, cast aluminium in daylight / dark bench. */
  ground: { light: '#E6E8E5', dark: '#0E1213' },
  /** Paper: ledgers, forms, header. */
  sheet: { light: '#FBFBF9', dark: '#171C1D' },
  /** Recess, hover row, inactive tab. */
  well: { light: '#EFF1EE', dark: '#202626' },
  /** Cast pad: codes, finished race. */
  plate: { light: '#CFD4D1', dark: '#343B3A' },
  /** Edge of a cast pad (decor). */
  'plate-edge': { light: '#8D9491', dark: '#6D7775' },
  /** Hairlines inside a sheet (decor). */
  line: { light: '#BBBFBC', dark: '#373D3E' },
  /** Control borders, steps not yet done, the wire. */
  'line-2': { light: '#757C79', dark: '#798382' },
  /** Text, heavy rules, frames. */
  ink: { light: '#12181A', dark: '#EDEDE9' },
  /** Second text. */
  'ink-2': { light: '#3D4647', dark: '#BDBFB8' },
  /** Manila: a physical unit or core. */
  tag: { light: '#EDDEB3', dark: '#302817' },
  /** Tag border and hole ring. */
  'tag-edge': { light: '#927239', dark: '#B19459' },
  /** Second text on a tag. */
  'tag-ink-2': { light: '#483B28', dark: '#D5CAAE' },
  /** LIVE: next action, held money, fluid. */
  red: { light: '#B20A20', dark: '#D92B30' },
  /** Action hover and down. */
  'red-press': { light: '#930317', dark: '#B61A25' },
  /** Held money as text, soon-due. */
  'red-ink': { light: '#9A0818', dark: '#F8918E' },
  /** Row or box holding money. */
  'red-soft': { light: '#FCE3E1', dark: '#3B1818' },
  /** Text on red. */
  'on-red': { light: '#FCFCFA', dark: '#FFFFFF' },
  /** Proved: fits, on sale. */
  green: { light: '#105E41', dark: '#309169' },
  /** Released or proved, as text. */
  'green-ink': { light: '#0D5037', dark: '#7BD3A9' },
  /** Proved row. */
  'green-soft': { light: '#D6F1E2', dark: '#153025' },
  /** Text on green. */
  'on-green': { light: '#FCFCFA', dark: '#070A0A' },
  /** Attention: needs a part, doubtful letter. */
  amber: { light: '#F5BF2F', dark: '#F2BF3F' },
  /** Attention as text and glyph. */
  'amber-ink': { light: '#604008', dark: '#F3CC6A' },
  /** Attention row. */
  'amber-soft': { light: '#FAECC4', dark: '#382C11' },
  /** Text on amber. */
  'on-amber': { light: '#12181A', dark: '#0C1011' },
  /** Second series, measure. */
  blue: { light: '#145491', dark: '#4B8AC9' },
  /** Links. */
  'blue-ink': { light: '#0C437D', dark: '#98C6F3' },
  /** Note row. */
  'blue-soft': { light: '#DCECFA', dark: '#192B40' },
  /** Errors and refusals: reversed block. */
  stop: { light: '#12181A', dark: '#EDEDE9' },
  /** Text on stop. */
  'on-stop': { light: '#FBFBF9', dark: '#0E1213' },
  /** Focus ring. */
  focus: { light: '#0859AC', dark: '#F8CC43' },
} as const satisfies Record<string, Token>;

export type TokenName = keyof typeof TOKENS;
export type Theme = 'light' | 'dark';

/** `{ '--ground': '#E6E8E5', ... }` for one theme. */
export function cssVariables(theme: Theme): Record<string, string> {
  return Object.fromEntries(Object.entries(TOKENS).map(([name, token]) => [`--${name}`, token[theme]]));
}
