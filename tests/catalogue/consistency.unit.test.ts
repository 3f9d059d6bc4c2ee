// The demo's catalogue must hang together as iron would: ratios from teeth, shared splines, joints that meet, codes that tell.
import { describe, expect, test } from 'vitest';
import { readDemoCatalogue } from '../../server/demo/catalogue';
import type { Family } from '../../shared/catalogue/family';
import type { InterfaceName, Interfaces } from '../../shared/catalogue/interfaces';
import { interfaceKey, JOINTS } from '../../shared/catalogue/joints';
import type { UnitKind } from '../../shared/catalogue/kinds';
import type { Variant } from '../../shared/catalogue/variant';
import { ratiosOf } from '../../shared/gearing/family-ratios';
import { toNumber } from '../../shared/gearing/fraction';
import { assemblyWarnings } from '../../shared/gearing/gearset';

const data = readDemoCatalogue();
const familyById = new Map(data.families.map((family) => [family.id, family]));
const ofKind = (kind: UnitKind): Family[] => data.families.filter((family) => family.kind === kind);
const kindOf = (variant: Variant): UnitKind | undefined => familyById.get(variant.familyId)?.kind;
const variantsOfKind = (kind: UnitKind): Variant[] => data.variants.filter((one) => kindOf(one) === kind);

const keyIn = <N extends InterfaceName>(side: Interfaces, name: N): string | null => {
  const value = side[name];
  return value === undefined ? null : interfaceKey(name, value);
};

/** Equal to three decimals, as the catalogue states ratios. */
const stated = (ratio: number | null | undefined): number | null =>
  ratio === null || ratio === undefined ? null : Math.round(ratio * 1000) / 1000;

describe('how much there is', () => {
  test('at least 12 makers, 60 families of four kinds, 200 variants, 40 adapters, 40 vehicles', () => {
    expect(new Set(data.families.map((family) => family.makerId)).size).toBeGreaterThanOrEqual(12);
    expect(ofKind('automatic').length).toBeGreaterThanOrEqual(24);
    expect(ofKind('manual').length).toBeGreaterThanOrEqual(12);
    expect(ofKind('transfer_case').length).toBeGreaterThanOrEqual(14);
    expect(ofKind('axle').length).toBeGreaterThanOrEqual(10);
    expect(data.variants.length).toBeGreaterThanOrEqual(200);
    expect(data.adapters.length).toBeGreaterThanOrEqual(40);
    expect(data.vehicles.length).toBeGreaterThanOrEqual(40);
  });

  test('every id is there once, and every variant has its family', () => {
    for (const list of [data.families, data.variants, data.adapters, data.vehicles]) {
      const ids = list.map((row) => row.id);
      expect(new Set(ids).size).toBe(ids.length);
    }
    expect(data.variants.filter((variant) => !familyById.has(variant.familyId))).toEqual([]);
    expect(data.families.filter((f) => !data.variants.some((v) => v.familyId === f.id))).toEqual([]);
  });
});

describe('ratios follow from the tooth counts', () => {
  test.each(data.families)('$maker $designation', (family) => {
    const worked = ratiosOf(family.gears).map(({ gear, ratio }) => ({
      gear,
      ratio: ratio && toNumber(ratio),
    }));
    const of = (gear: string) => stated(worked.find((one) => one.gear === gear)?.ratio);
    const forward = worked
      .filter((one) => !['R', 'H', 'L'].includes(one.gear))
      .map((one) => stated(one.ratio));
    expect(forward).toEqual(family.forwardRatios);
    expect(of('R')).toBe(family.reverseRatio);
    expect(of('L')).toBe(family.lowRange);
  });

  test.each(ofKind('automatic').concat(ofKind('manual')))(
    '$maker $designation: each gear is taller than the one before, one is direct, reverse turns back',
    ({ forwardRatios, reverseRatio }) => {
      expect([...forwardRatios].sort((a, b) => b - a)).toEqual(forwardRatios);
      expect(new Set(forwardRatios).size).toBe(forwardRatios.length);
      expect(reverseRatio).toBeLessThan(-1);
    },
  );

  test('direct drive is there wherever two members can be driven at once or the shafts joined', () => {
    const layouts = data.families.filter(
      ({ gears }) =>
        gears.type === 'countershaft' || (gears.type === 'planetary' && gears.layout !== 'simple_ravigneaux'),
    );
    expect(layouts.filter(({ forwardRatios }) => !forwardRatios.includes(1))).toEqual([]);
  });

  test('every planetary set can be put together', () => {
    const warnings = data.families.flatMap(({ gears }) => {
      if (gears.type === 'planetary') return gears.sets.flatMap(assemblyWarnings);
      if (gears.type === 'planetary_low') return assemblyWarnings({ ...gears, type: 'simple', name: 'low' });
      return [];
    });
    expect(warnings).toEqual([]);
  });

  test('the pairs of a countershaft share one distance between shafts: their teeth add up alike', () => {
    for (const { gears, designation } of ofKind('manual')) {
      if (gears.type !== 'countershaft') throw new Error(`${designation} has no countershaft`);
      const sums = [gears.input + gears.counter, ...gears.pairs.map((pair) => pair.counter + pair.main)];
      expect(Math.max(...sums) - Math.min(...sums), designation).toBeLessThanOrEqual(2);
    }
  });
});

describe('figures are plausible', () => {
  test.each([
    // Typical dry weights, common practice: light automatics from 100 lb, heavy six-speeds to 300 lb; axles to 350 lb.
    ['automatic', 100, 300],
    ['manual', 75, 200],
    ['transfer_case', 55, 135],
    ['axle', 150, 350],
  ] as const)('%s weighs %i to %i lb', (kind, least, most) => {
    for (const family of ofKind(kind)) {
      expect(family.dryWeightLb).toBeGreaterThanOrEqual(least);
      expect(family.dryWeightLb).toBeLessThanOrEqual(most);
    }
  });

  test('iron and aluminium: 10 to 170 lb for each cubic foot of the box it fills', () => {
    for (const { lengthMm, widthMm, heightMm, dryWeightLb, designation } of data.families) {
      const cubicFeet = (lengthMm * widthMm * heightMm) / 304.8 ** 3;
      expect(dryWeightLb / cubicFeet, designation).toBeGreaterThan(10);
      expect(dryWeightLb / cubicFeet, designation).toBeLessThan(170);
    }
  });

  test('every family says where it usually fails and what its hard parts cost', () => {
    for (const family of data.families) {
      expect(family.failurePoints.length).toBeGreaterThanOrEqual(3);
      expect(family.hardParts.length).toBeGreaterThanOrEqual(4);
      expect(family.hardParts.every((part) => part.lowCents > 0 && part.lowCents < part.highCents)).toBe(
        true,
      );
    }
  });
});

describe('interfaces', () => {
  test('a variant has only the joints of its kind, and the deciding ones are known', () => {
    for (const variant of data.variants) {
      const joints = JOINTS[kindOf(variant) ?? 'automatic'];
      const names = joints.map((joint) => joint.name);
      expect(Object.keys(variant.interfaces).filter((name) => !names.some((one) => one === name))).toEqual(
        [],
      );
      const unknown = joints.filter(
        (joint) => joint.deciding && variant.interfaces[joint.name] === undefined,
      );
      expect(unknown, variant.id).toEqual([]);
    }
  });

  test('some advisory joints are not known, as in life', () => {
    const gaps = data.variants.filter((variant) =>
      JOINTS[kindOf(variant) ?? 'automatic'].some((joint) => variant.interfaces[joint.name] === undefined),
    );
    expect(gaps.length).toBeGreaterThan(5);
  });

  test('a maker of gearboxes uses few input splines, and one output for each rear face', () => {
    const boxes = [...variantsOfKind('automatic'), ...variantsOfKind('manual')];
    const makers = new Set(boxes.map((one) => familyById.get(one.familyId)?.makerId));
    for (const maker of makers) {
      const own = boxes.filter((one) => familyById.get(one.familyId)?.makerId === maker);
      expect(new Set(own.map((one) => keyIn(one.interfaces, 'inputSpline'))).size, maker).toBeLessThanOrEqual(
        2,
      );
    }
    const outputs = new Map<string, Set<string | null>>();
    for (const { interfaces } of boxes) {
      const face = interfaces.rearPattern?.pattern ?? '';
      outputs.set(face, (outputs.get(face) ?? new Set()).add(keyIn(interfaces, 'outputSpline')));
    }
    expect([...outputs].filter(([, splines]) => splines.size !== 1)).toEqual([]);
  });

  test('a pattern has one number of bolts wherever it appears', () => {
    const bolts = new Map<string, Set<number>>();
    for (const { interfaces: i } of data.variants)
      for (const one of [i.enginePattern, i.rearPattern])
        if (one) bolts.set(one.pattern, (bolts.get(one.pattern) ?? new Set()).add(one.bolts));
    expect([...bolts].filter(([, counts]) => counts.size !== 1)).toEqual([]);
  });

  test('for every four-wheel-drive box there is a transfer case with its face and spline, built in its years', () => {
    const cases = variantsOfKind('transfer_case');
    const boxes = data.variants.filter((one) => one.interfaces.outputSpline?.form === 'female');
    expect(boxes.length).toBeGreaterThan(60);
    const alone = boxes.filter(
      (box) =>
        !cases.some(
          (one) =>
            keyIn(one.interfaces, 'rearPattern') === keyIn(box.interfaces, 'rearPattern') &&
            one.interfaces.inputSpline?.count === box.interfaces.outputSpline?.count &&
            one.interfaces.inputSpline?.diameterMm === box.interfaces.outputSpline?.diameterMm,
        ),
    );
    expect(alone.map((one) => one.id)).toEqual([]);
  });

  test('the ratio of an axle is one of its family', () => {
    for (const variant of variantsOfKind('axle')) {
      const gears = familyById.get(variant.familyId)?.gears;
      const pairs = gears?.type === 'ring_and_pinion' ? gears.pairs : [];
      expect(pairs).toContainEqual(variant.interfaces.axleRatio);
    }
  });

  test('an adapter goes from a joint that a unit has to one that a unit or vehicle has', () => {
    const units = data.variants.map((one) => one.interfaces);
    const presented = data.vehicles.flatMap(({ joints }) => Object.values(joints));
    for (const one of data.adapters) {
      const has = (side: Interfaces) => keyIn(side, one.interface);
      expect(units.map(has), one.id).toContain(has(one.from));
      expect([...units, ...presented].map(has), one.id).toContain(has(one.to));
      expect(has(one.from), one.id).not.toBe(has(one.to));
    }
  });
});

describe('vehicles', () => {
  test('each presents what the units fitted at the plant have, in years those units were made', () => {
    for (const vehicle of data.vehicles) {
      const fitted = data.variants.filter((one) => vehicle.unitIds.includes(one.id));
      expect(fitted.length, vehicle.id).toBe(vehicle.unitIds.length);
      expect(fitted.length, vehicle.id).toBeGreaterThanOrEqual(2);
      for (const unit of fitted) {
        expect(vehicle.joints[kindOf(unit) ?? 'automatic'], vehicle.id).toEqual(unit.interfaces);
        expect(unit.modelYears.from <= vehicle.yearTo && unit.modelYears.to >= vehicle.yearFrom).toBe(true);
      }
    }
  });
});
