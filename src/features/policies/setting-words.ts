import type { PolicyOverview } from '#contract/policies';
import { policyParameters, type PolicyParameter, type QuantityParameter } from '#domain/load/policy';
import type { SettingChange } from '#domain/policy/setting-change';
import { findParameter, type SettingValue } from '#domain/policy/settings';
import type { UnitSystem } from '../../lib/facility';
import { readNumber } from '../../lib/format';

type Scale = {
  /** Written after the figure, with its space. */
  readonly unit: string;
  readonly toShown: (kept: number) => number;
  readonly toKept: (shown: number) => number;
  readonly decimals: number;
};

const same = (value: number) => value;

// Exact by definition: NIST SP 811 (2008), appendix B.8.
const mmPerInch = 25.4;
const kgPerPound = 0.453_592_37;

function times(factor: number, keptDecimals: number): Pick<Scale, 'toShown' | 'toKept'> {
  return {
    toShown: (kept) => kept / factor,
    toKept: (shown) => Number((shown * factor).toFixed(keptDecimals)),
  };
}

function plain(unit: string, decimals: number): Scale {
  return { unit, toShown: same, toKept: same, decimals };
}

/** A unit that is not here is shown as it is called, in either system. */
const scales: Readonly<Record<UnitSystem, Readonly<Record<string, Scale>>>> = {
  metric: {
    mm: plain(' mm', 1),
    kg: plain(' kg', 3),
    'kg/min': plain(' kg/min', 4),
    degC: plain(' °C', 1),
    deg: plain('°', 1),
    count: plain('', 0),
  },
  'us-customary': {
    mm: { unit: ' in', decimals: 2, ...times(mmPerInch, 1) },
    kg: { unit: ' lb', decimals: 2, ...times(kgPerPound, 3) },
    'kg/min': { unit: ' lb/min', decimals: 3, ...times(kgPerPound, 4) },
    degC: {
      unit: ' °F',
      toShown: (celsius) => celsius * 1.8 + 32,
      toKept: (fahrenheit) => Number(((fahrenheit - 32) / 1.8).toFixed(1)),
      decimals: 0,
    },
    deg: plain('°', 1),
    count: plain('', 0),
  },
};

function scaleOf(unit: string, unitSystem: UnitSystem): Scale {
  return scales[unitSystem][unit] ?? plain(` ${unit}`, 4);
}

/** What stands behind the figure in a field: "mm", "lb". */
export function unitWord({ unit }: QuantityParameter, unitSystem: UnitSystem): string {
  return scaleOf(unit, unitSystem).unit.trim();
}

/** A kept figure as it is written into a field. */
export function shownFigure({ unit }: QuantityParameter, kept: number, unitSystem: UnitSystem): string {
  const { toShown, decimals } = scaleOf(unit, unitSystem);
  return String(Number(toShown(kept).toFixed(decimals)));
}

/** The ends of the range as they may be written: rounded inwards, so that what is shown is also taken. */
function shownEnds({ unit, range }: QuantityParameter, unitSystem: UnitSystem): readonly [string, string] {
  const { toShown, decimals } = scaleOf(unit, unitSystem);
  const step = 10 ** decimals;
  // A hair's breadth, or 5 mm would become 5.01 where 5 / 1 * 100 is not quite 500.
  const least = Math.ceil(toShown(range.least) * step - 1e-6) / step;
  const greatest = Math.floor(toShown(range.greatest) * step + 1e-6) / step;
  return [String(least), String(greatest)];
}

/**
 * What was written, as it is kept; undefined for what is no number. Where the figure written is the very one that is shown
 * for a value we know, that value is meant, and not its rounded neighbour.
 */
export function keptFigure(
  parameter: QuantityParameter,
  text: string,
  { unitSystem, known }: { readonly unitSystem: UnitSystem; readonly known: readonly number[] },
): number | undefined {
  const written = readNumber(text);
  if (written === undefined) return undefined;
  const meant = [...known, parameter.default].find(
    (value) => Number(shownFigure(parameter, value, unitSystem)) === written,
  );
  return meant ?? scaleOf(parameter.unit, unitSystem).toKept(written);
}

/** "25 mm", "0.98 in", "Holds the load". */
export function valueWords(parameter: PolicyParameter, value: SettingValue, unitSystem: UnitSystem): string {
  if (parameter.form === 'choice') {
    return parameter.choices.find((choice) => choice.value === value)?.label ?? String(value);
  }
  return typeof value === 'number'
    ? `${shownFigure(parameter, value, unitSystem)}${scaleOf(parameter.unit, unitSystem).unit}`
    : value;
}

/** "0" and "200 mm" */
export function endsWords(parameter: QuantityParameter, unitSystem: UnitSystem): readonly [string, string] {
  const [least, greatest] = shownEnds(parameter, unitSystem);
  return [least, `${greatest}${scaleOf(parameter.unit, unitSystem).unit}`];
}

/** "0 to 200 mm" */
export function rangeWords(parameter: QuantityParameter, unitSystem: UnitSystem): string {
  return endsWords(parameter, unitSystem).join(' to ');
}

/** What is wrong with a figure, in the unit it was written in. */
export function figureProblem(
  parameter: QuantityParameter,
  kept: number | undefined,
  unitSystem: UnitSystem,
): string | null {
  if (kept === undefined) return 'Please write a number.';
  const [least, greatest] = shownEnds(parameter, unitSystem);
  const { unit } = scaleOf(parameter.unit, unitSystem);
  if (kept < parameter.range.least) return `At least ${least}${unit}.`;
  if (kept > parameter.range.greatest) return `At most ${greatest}${unit}.`;
  return null;
}

/** Where a default comes from, in a word or two before the source itself. */
const provenances: Readonly<Record<PolicyParameter['source']['provenance'], string>> = {
  published: 'Published',
  restated: 'Restated by others',
  'common-practice': 'Common practice',
  'from-memory': 'From memory, not looked up',
  'house-rule': 'Yours to set',
  ifu: 'Instructions for use',
};

export function provenanceWords({ source }: PolicyParameter): string {
  return provenances[source.provenance];
}

const asTheFacility = 'As the facility’s rule';

export type ChangeWords = {
  readonly key: string;
  readonly what: string;
  readonly before: string;
  readonly after: string;
};

/** One change in words; the name of a setting that there is no more stands as it was kept. */
export function changeWords(
  change: SettingChange,
  sterilizers: PolicyOverview['sterilizers'],
  unitSystem: UnitSystem,
): ChangeWords {
  if (change.of === 'parameter') {
    const parameter = findParameter(change.id);
    const words = (value: SettingValue) =>
      parameter === undefined ? String(value) : valueWords(parameter, value, unitSystem);
    return {
      key: change.id,
      what: parameter?.label ?? change.id,
      before: words(change.before),
      after: words(change.after),
    };
  }
  const name = sterilizers.find((one) => one.id === change.sterilizerId)?.name ?? 'A sterilizer that is gone';
  return {
    key: change.sterilizerId,
    what: `${name}: which way pouches on edge face`,
    before: facingWords(change.before),
    after: facingWords(change.after),
  };
}

const facing = policyParameters.find((parameter) => parameter.id === 'facing');

/** How a sterilizer faces; null: as the facility says. */
export function facingWords(rule: string | null): string {
  if (rule === null) return asTheFacility;
  return facing === undefined ? rule : valueWords(facing, rule, 'metric');
}
