// A browser's own description in a few words, so that somebody can tell a phone from a desk.

const SYSTEMS: readonly (readonly [RegExp, string])[] = [
  [/iPhone|iPad/, 'iPhone or iPad'],
  [/Android/, 'Android'],
  [/Windows/, 'Windows'],
  [/Mac OS X/, 'Mac'],
  [/CrOS/, 'Chromebook'],
  [/Linux/, 'Linux'],
];

/** The order matters: most browsers also name the ones they descend from. */
const BROWSERS: readonly (readonly [RegExp, string])[] = [
  [/Edg\//, 'Edge'],
  [/OPR\//, 'Opera'],
  [/Firefox\//, 'Firefox'],
  [/Chrome\//, 'Chrome'],
  [/Safari\//, 'Safari'],
];

const find = (list: typeof SYSTEMS, agent: string): string | null =>
  list.find(([pattern]) => pattern.test(agent))?.[1] ?? null;

/** "Firefox on Windows"; the first words of the description where nothing in it is known. */
export function browserWords(agent: string): string {
  const browser = find(BROWSERS, agent);
  const system = find(SYSTEMS, agent);
  if (browser && system) return `${browser} on ${system}`;
  return browser ?? system ?? (agent.slice(0, 40) || 'Not known');
}
