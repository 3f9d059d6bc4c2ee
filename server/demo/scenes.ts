// The scenes of the demo: what each order has been through, hours back from now.
import { composeCode } from '../../shared/reading/compose-code';
import type { CatalogueData } from '../../shared/catalogue/contract';
import { openOrder, type Opening, type Stage, type Walk } from './orders';
import { chanceOf } from './random';
import type { SeededUnit } from './units';

const DAY = 24;
const CORE_SHOTS: readonly (readonly [picture: string, shot: string])[] = [
  ['r-left', 'left'],
  ['r-bell', 'bell'],
  ['r-code', 'code'],
  ['r-pan', 'pan'],
  ['r-ear-ok', 'damage'],
];

async function pack(walk: Walk, hoursAgo: number): Promise<void> {
  walk.at(hoursAgo);
  for (const picture of ['a-pallet', 'a-left', 'a-plug']) await walk.photo(walk.dock, 'pack', picture);
  const { tagCode } = await walk.order();
  await walk.take(walk.dock, 'pack', { tagCode, drained: true, plugged: true });
}

async function ship(walk: Walk, hoursAgo: number): Promise<void> {
  await pack(walk, hoursAgo + 5);
  walk.at(hoursAgo);
  await walk.take(walk.dock, 'hand_over', {
    carrier: 'Overpass Freight',
    tracking: `PRO ${hoursAgo * 7919}`,
  });
}

async function deliver(walk: Walk, hoursAgo: number): Promise<void> {
  await ship(walk, hoursAgo + 3 * DAY);
  walk.at(hoursAgo);
  await walk.take(walk.builder, 'deliver', {});
}

async function accept(walk: Walk, hoursAgo: number): Promise<void> {
  await deliver(walk, hoursAgo + DAY);
  walk.at(hoursAgo);
  await walk.take(walk.builder, 'accept', {});
}

/** The old unit bears a code of the same family. */
function oldCode(data: CatalogueData, unit: SeededUnit): string {
  const chance = chanceOf(unit.listingId.length + unit.code.length);
  const same = data.variants.filter((one) => one.familyId === unit.familyId && one.codePatterns.length > 0);
  const variant = chance.pick(same);
  return composeCode(chance.pick(variant.codePatterns), {
    builtOn: variant.builtFrom,
    pick: (all) => chance.pick(all),
  });
}

async function book(walk: Walk, data: CatalogueData, unit: SeededUnit, hoursAgo: number): Promise<void> {
  walk.at(hoursAgo);
  for (const [picture, shot] of CORE_SHOTS) await walk.photo(walk.builder, 'core', picture, shot);
  await walk.take(walk.builder, 'book_return', { caseCode: oldCode(data, unit), variantId: unit.variantId });
}

async function send(walk: Walk, data: CatalogueData, unit: SeededUnit, hoursAgo: number): Promise<void> {
  await book(walk, data, unit, hoursAgo + 6);
  walk.at(hoursAgo);
  await walk.take(walk.builder, 'send', {
    method: 'carrier',
    carrier: 'Overpass Freight',
    tracking: `PRO ${hoursAgo * 6151}`,
  });
}

async function receive(walk: Walk, data: CatalogueData, unit: SeededUnit, hoursAgo: number): Promise<void> {
  await send(walk, data, unit, hoursAgo + 3 * DAY);
  walk.at(hoursAgo);
  await walk.take(walk.dock, 'receive', {});
}

async function grade(
  walk: Walk,
  data: CatalogueData,
  unit: SeededUnit,
  hoursAgo: number,
  codes: readonly string[],
): Promise<void> {
  await receive(walk, data, unit, hoursAgo + 8);
  walk.at(hoursAgo);
  await walk.photo(walk.dock, 'grade', 'r-left-in', 'left');
  await walk.photo(walk.dock, 'grade', 'r-bell-in', 'bell');
  const pictures: Record<string, readonly [string, string]> = {
    ears: ['r-ear-bad', 'damage'],
    pan: ['r-pan-in', 'pan'],
  };
  const deductions = [];
  for (const code of codes) {
    const [picture, shot] = pictures[code] ?? ['r-left-in', 'left'];
    deductions.push({ code, photoId: await walk.photo(walk.dock, 'grade', picture, shot) });
  }
  await walk.take(walk.dock, 'grade', {
    grade: codes.length === 0 ? 'A' : codes.includes('ears') ? 'C' : 'B',
    deductions,
  });
}

async function contest(walk: Walk, data: CatalogueData, unit: SeededUnit, hoursAgo: number): Promise<void> {
  await grade(walk, data, unit, hoursAgo + 20, ['ears', 'pan']);
  walk.at(hoursAgo);
  await walk.photo(walk.builder, 'contest', 'r-ear-ok', 'damage');
  await walk.take(walk.builder, 'contest', {
    reason: 'The ear was whole when it left here. My photo of the strapped pallet shows it.',
  });
}

async function refuse(walk: Walk, hoursAgo: number): Promise<void> {
  await deliver(walk, hoursAgo + 10);
  walk.at(hoursAgo);
  await walk.photo(walk.builder, 'refuse', 'a-damage', 'damage');
  await walk.take(walk.builder, 'refuse', {
    reason: 'There is a crack at the lower ear that no photo showed.',
  });
}

type Play = (walk: Walk, unit: SeededUnit) => Promise<void>;

interface Scene extends Omit<Opening, 'unit'> {
  readonly play: Play;
}

const ONE = 'builder@demo.example';
const TWO = 'builder2@demo.example';
const THREE = 'builder3@demo.example';

function scenes(data: CatalogueData): readonly Scene[] {
  return [
    { builderEmail: TWO, hoursAgo: 0.1, paid: false, play: async () => undefined },
    { builderEmail: ONE, hoursAgo: 20, play: async () => undefined },
    { builderEmail: TWO, hoursAgo: 30, play: (w) => pack(w, 4) },
    { builderEmail: ONE, hoursAgo: 4 * DAY, play: (w) => ship(w, 2 * DAY) },
    {
      builderEmail: THREE,
      hoursAgo: 3 * DAY,
      method: 'pickup',
      play: async (w) => {
        await pack(w, 2 * DAY);
        w.at(DAY);
        await w.take(w.dock, 'hand_over', { pickupCode: (await w.order()).pickupCode });
      },
    },
    { builderEmail: TWO, hoursAgo: 7 * DAY, play: (w) => deliver(w, DAY) },
    { builderEmail: ONE, hoursAgo: 24 * DAY, play: (w) => accept(w, 17 * DAY) },
    {
      builderEmail: TWO,
      hoursAgo: 26 * DAY,
      play: async (w, u) => {
        await accept(w, 19 * DAY);
        await book(w, data, u, 2 * DAY);
      },
    },
    {
      builderEmail: ONE,
      hoursAgo: 30 * DAY,
      play: async (w, u) => {
        await accept(w, 22 * DAY);
        await send(w, data, u, DAY);
      },
    },
    {
      builderEmail: TWO,
      hoursAgo: 31 * DAY,
      play: async (w, u) => {
        await accept(w, 24 * DAY);
        await receive(w, data, u, 5);
      },
    },
    {
      builderEmail: ONE,
      hoursAgo: 33 * DAY,
      play: async (w, u) => {
        await accept(w, 26 * DAY);
        await grade(w, data, u, 6, ['pan']);
      },
    },
    {
      builderEmail: ONE,
      hoursAgo: 35 * DAY,
      play: async (w, u) => {
        await accept(w, 28 * DAY);
        await contest(w, data, u, 8);
      },
    },
    {
      builderEmail: TWO,
      hoursAgo: 60 * DAY,
      play: async (w, u) => {
        await accept(w, 52 * DAY);
        await grade(w, data, u, 40 * DAY, ['pan', 'plug']);
        w.at(39 * DAY);
        await w.take(w.builder, 'agree', {});
      },
    },
    {
      builderEmail: THREE,
      hoursAgo: 62 * DAY,
      play: async (w, u) => {
        await accept(w, 54 * DAY);
        await grade(w, data, u, 41 * DAY, []);
        w.at(40 * DAY);
        await w.take(w.builder, 'agree', {});
      },
    },
    {
      builderEmail: THREE,
      hoursAgo: 40 * DAY,
      play: async (w) => {
        await accept(w, 32 * DAY);
        w.at(20 * DAY);
        await w.take(w.builder, 'keep_unit', {});
      },
    },
    {
      builderEmail: 'builder4@demo.example',
      hoursAgo: 85 * DAY,
      play: async (w) => {
        await accept(w, 76 * DAY);
        w.at(20 * DAY);
        await w.strike('lapse');
      },
    },
    { builderEmail: THREE, hoursAgo: 9 * DAY, play: (w) => refuse(w, DAY) },
    {
      builderEmail: 'builder4@demo.example',
      hoursAgo: 50 * DAY,
      play: async (w) => {
        await refuse(w, 42 * DAY);
        w.at(38 * DAY);
        const order = await w.order();
        const held = order.priceCents + order.freightCents + order.depositCents;
        await w.settle(
          'outbound',
          held - 9_500,
          9_500,
          'The crack is old and was not shown. The unit goes back; the freight out is shared.',
        );
      },
    },
    {
      builderEmail: TWO,
      hoursAgo: 15 * DAY,
      play: async (w) => {
        w.at(14 * DAY);
        await w.take(w.dock, 'cancel', {
          reason: 'The forks went through the pan while loading.',
          cannotSupply: true,
        });
      },
    },
    { builderEmail: ONE, hoursAgo: 6 * DAY, terms: 'outright', play: (w) => ship(w, 4 * DAY) },
    { builderEmail: THREE, hoursAgo: 28 * DAY, terms: 'outright', play: (w) => accept(w, 20 * DAY) },
  ];
}

/** Every scene on an automatic: the yard with three people has most of them, so that its desk has work. */
export async function playScenes(
  stage: Stage,
  units: readonly SeededUnit[],
  data: CatalogueData,
): Promise<number> {
  const mine = units.filter((unit) => unit.kind === 'automatic' && unit.seller.spec.members.length > 1);
  const others = units.filter(
    (unit) => unit.kind === 'automatic' && unit.seller.spec.members.length === 1 && unit.seller.spec.paidOut,
  );
  const plays = scenes(data);
  for (const [index, scene] of plays.entries()) {
    const pool = index % 5 === 2 ? others : mine;
    // From the old end of the list: what is on the home page as just pulled stays on sale.
    const unit = pool[index];
    if (!unit) throw new Error('too few units for the scenes');
    const walk = await openOrder(stage, { ...scene, unit });
    await scene.play(walk, unit);
  }
  return plays.length;
}
