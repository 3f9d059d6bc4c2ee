// The pictures of the demo: rendered stand-ins where there is one for the shot, drawn ones elsewhere. All labelled as drawn.
import fs from 'node:fs';
import path from 'node:path';
import type { UnitKind } from '../../shared/catalogue/kinds';
import { demoFolder } from './folder';
import type { Chance } from './random';
import { drawView } from './stand-in';

const RENDERED: Readonly<Record<UnitKind, Readonly<Record<string, readonly string[]>>>> = {
  automatic: {
    left: ['a-left', 'b-left', 'c-left', 'd-left', 'e-left'],
    right: ['a-right'],
    bell: ['a-bell'],
    output: ['a-output'],
    pan: ['a-pan'],
    plug: ['a-plug'],
    damage: ['a-damage'],
  },
  manual: { left: ['m-left'] },
  transfer_case: { left: ['t-left', 't2-left'] },
  axle: { right: ['x-rear'] },
};

const read = new Map<string, Promise<Buffer>>();

const once = (key: string, make: () => Promise<Buffer>): Promise<Buffer> => {
  const known = read.get(key) ?? make();
  read.set(key, known);
  return known;
};

export const renderedPicture = (name: string): Promise<Buffer> =>
  once(name, () => fs.promises.readFile(path.join(demoFolder('photos'), `${name}.jpg`)));

export function pictureOf(kind: UnitKind, shot: string, shotNumber: number, chance: Chance): Promise<Buffer> {
  const names = RENDERED[kind][shot];
  if (names) return renderedPicture(chance.pick(names));
  return once(`${kind} ${shot}`, () => drawView(kind, shotNumber));
}
