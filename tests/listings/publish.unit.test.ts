// What keeps a draft from being published, by name; the shot lists; and the words a used unit may not claim.
import { describe, expect, test } from 'vitest';
import { claimsIn } from '../../shared/listings/claims';
import { UNIT_KINDS } from '../../shared/catalogue/kinds';
import { checklist, type Answers } from '../../shared/listings/condition';
import { missingForPublish, type DraftFacts } from '../../shared/listings/publish';
import { requiredShots, shotList, SHOT_CODES } from '../../shared/listings/shots';

const answers: Answers = Object.fromEntries(checklist('automatic').map((one) => [one.code, 'yes' as const]));

const whole: DraftFacts = {
  kind: 'automatic',
  variantId: 'var_1',
  caseCode: 'K66A 4X D9 09147 03',
  state: 'pulled',
  rebuilt: false,
  condition: answers,
  priceCents: 145_000,
  exchange: {
    depositCents: 60_000,
    windowDays: 45,
    schedule: [{ code: 'pan', label: 'Pan missing', cents: 4_000 }],
    returnFreight: 'seller',
  },
  outright: true,
  outrightCents: 198_000,
  freight: { weightLb: 245, lengthIn: 40, widthIn: 32, heightIn: 30 },
  notes: 'Pulled for engine.',
};
const shots = ['left', 'right', 'bell', 'output', 'pan', 'code', 'plug'];
const yard = { kind: 'yard' as const };
const paths = (
  draft: DraftFacts,
  taken = shots,
  seller: Parameters<typeof missingForPublish>[2] = yard,
  checked = true,
) => missingForPublish(draft, taken, seller, checked).map((error) => error.path);

describe('publishing', () => {
  test('when all is there, then nothing is missing', () => {
    expect(paths(whole)).toEqual([]);
  });

  test('when nothing is there, then every missing thing is named at once', () => {
    const empty: DraftFacts = {
      ...whole,
      caseCode: '',
      condition: {},
      priceCents: null,
      exchange: null,
      outright: false,
      outrightCents: null,
      freight: null,
      notes: '',
    };
    expect(paths(empty, [], yard, false)).toEqual([
      'caseCode',
      ...checklist('automatic').map((one) => `condition.${one.code}`),
      ...shots.map((shot) => `photos.${shot}`),
      'priceCents',
      'terms',
      'freight',
      'account.mail',
    ]);
  });

  test.each(shots)('when shot %s is missing, then it alone is named', (shot) => {
    expect(
      paths(
        whole,
        shots.filter((taken) => taken !== shot),
      ),
    ).toEqual([`photos.${shot}`]);
  });

  test('when the case is damaged, then the worst spot must be shown', () => {
    const cracked = { ...whole, condition: { ...answers, case_whole: 'no' as const } };
    expect(paths(cracked)).toEqual(['photos.damage']);
    expect(paths(cracked, [...shots, 'damage'])).toEqual([]);
  });

  test('when it is still in the vehicle, then only what can be reached is asked for', () => {
    const inside: DraftFacts = { ...whole, state: 'in_vehicle', condition: { ...answers, drained: 'no' } };
    expect(paths(inside, [])).toEqual(['photos.pan', 'photos.code']);
  });

  test('when the identifying number was removed, then it cannot be published whatever else is there', () => {
    const errors = missingForPublish(
      { ...whole, condition: { ...answers, number_intact: 'no' } },
      shots,
      yard,
      true,
    );
    expect(errors).toEqual([
      { path: 'condition.number_intact', message: expect.stringContaining('18 U.S.C. 511') },
    ]);
    expect(paths({ ...whole, condition: { ...answers, number_intact: 'unknown' } })).toEqual([
      'condition.number_intact',
    ]);
  });

  test('when a pulled unit is not drained, then it waits until it is', () => {
    expect(paths({ ...whole, condition: { ...answers, drained: 'no' } })).toEqual(['condition.drained']);
  });

  test('when the notes claim a rebuild that was not said, then they are refused with the word', () => {
    const errors = missingForPublish({ ...whole, notes: 'Fully rebuilt last year.' }, shots, yard, true);
    expect(errors).toEqual([{ path: 'notes', message: expect.stringContaining('rebuilt') }]);
  });

  test('when it is said to be rebuilt, then only a rebuilder may say so, and must tell what was done', () => {
    const rebuilt = { ...whole, rebuilt: true };
    expect(paths(rebuilt)).toEqual(['rebuilt']);
    expect(paths(rebuilt, shots, { kind: 'rebuilder' })).toEqual(['notes']);
    const told = {
      ...rebuilt,
      notes: 'Taken apart, cleaned, new frictions, seals, bushings and pump gears, end play set.',
    };
    expect(paths(told, shots, { kind: 'rebuilder' })).toEqual([]);
  });
});

describe('words about a used unit', () => {
  test.each([
    ['Rebuilt 2 years ago', 'Rebuilt'],
    ['This is a rebuilt one', 'rebuilt'],
    ['Has a fresh rebuild', 'fresh rebuild'],
    ['reman unit, low miles', 'reman'],
    ['Remanufactured by the factory', 'Remanufactured'],
    ['re-conditioned core', 're-conditioned'],
    ['just overhauled', 'overhauled'],
    ['works like new', 'like new'],
    ['new transmission, in crate', 'new transmission'],
    ['NOS part', 'NOS'],
  ])('when the text says “%s”, then it claims “%s”', (text, word) => {
    expect(claimsIn(text).map((claim) => claim.word)).toEqual([word]);
  });

  test.each([
    'Not rebuilt, sold as a core',
    'Needs to be rebuilt',
    'Needs a full rebuild',
    'It isn’t rebuilt',
    'never rebuilt',
    'Good core to rebuild',
    'Rebuild kit included',
    'new pan gasket last spring',
    'Pulled for your rebuild',
    'New plug lead in the box',
  ])('when the text says “%s”, then it claims nothing', (text) => {
    expect(claimsIn(text)).toEqual([]);
  });
});

describe('the shot list', () => {
  test.each(UNIT_KINDS)(
    'when a %s is shot, then there are nine, numbered, each told in at most eight words',
    (kind) => {
      const list = shotList(kind);
      expect(list.map((shot) => shot.number)).toEqual([1, 2, 3, 4, 5, 6, 7, 8, 9]);
      expect(new Set(list.map((shot) => shot.code)).size).toBe(9);
      for (const shot of list) {
        expect(shot.instruction.split(/\s+/).length).toBeLessThanOrEqual(8);
        expect(SHOT_CODES).toContain(shot.code);
      }
      expect(requiredShots(kind, 'pulled', {}).map((shot) => shot.code)).toContain('code');
      expect(requiredShots(kind, 'in_vehicle', {}).length).toBeLessThan(
        requiredShots(kind, 'pulled', {}).length,
      );
    },
  );
});
