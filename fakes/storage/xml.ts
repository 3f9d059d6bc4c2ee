// The little XML that the object store's API needs: elements out, keys of a delete request in.
import { StorageError } from './errors';

type Xml = string | number | boolean | readonly Xml[] | { readonly [name: string]: Xml | undefined };

const ENTITIES: Readonly<Record<string, string>> = {
  '&': '&amp;',
  '<': '&lt;',
  '>': '&gt;',
  '"': '&quot;',
  "'": '&apos;',
};

const escapeXml = (text: string): string => text.replace(/[&<>"']/g, (mark) => ENTITIES[mark] ?? mark);

const isList = (value: Xml): value is readonly Xml[] => Array.isArray(value);

function element(name: string, value: Xml): string {
  if (isList(value)) return value.map((each) => element(name, each)).join('');
  if (typeof value !== 'object') return `<${name}>${escapeXml(String(value))}</${name}>`;
  const inner = Object.entries(value)
    .map(([child, held]) => (held === undefined ? '' : element(child, held)))
    .join('');
  return `<${name}>${inner}</${name}>`;
}

const NAMESPACE = ' xmlns="http://s3.amazonaws.com/doc/2006-03-01/"';

export const document = (name: string, value: Xml): string =>
  `<?xml version="1.0" encoding="UTF-8"?>\n${element(name, value).replace(`<${name}`, `<${name}${name === 'Error' ? '' : NAMESPACE}`)}`;

function unescapeXml(text: string): string {
  return text.replace(/&(#x?[0-9a-fA-F]+|[a-z]+);/g, (whole, name: string) => {
    if (name.startsWith('#x')) return String.fromCodePoint(Number.parseInt(name.slice(2), 16));
    if (name.startsWith('#')) return String.fromCodePoint(Number(name.slice(1)));
    return Object.keys(ENTITIES).find((mark) => ENTITIES[mark] === whole) ?? whole;
  });
}

/** @throws StorageError when there is no key in it */
export function readDeleteRequest(xml: string): { keys: string[]; quiet: boolean } {
  const objects = Array.from(xml.matchAll(/<Object\b[^>]*>([\s\S]*?)<\/Object>/g), (found) => found[1] ?? '');
  const keys = objects.map((inner) => unescapeXml(/<Key>([\s\S]*?)<\/Key>/.exec(inner)?.[1] ?? ''));
  if (keys.length === 0 || keys.length > 1000 || keys.includes(''))
    throw new StorageError('MalformedXML', 'The XML is not a delete request with 1 to 1000 keys.');
  return { keys, quiet: /<Quiet>\s*true\s*<\/Quiet>/.test(xml) };
}
