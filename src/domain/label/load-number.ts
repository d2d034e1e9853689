import { accept, refuse, type Result } from '../result';
import { ordinalDay } from '../time/calendar-day';

/*
 * The number of a load, which every package processed in it carries: 2-26076-03 is sterilizer 2, day 76 of 2026, third load
 * of that day. How it is written is a facility's setting. So is when its day begins, at midnight or with a shift: which day
 * an instant belongs to is told by `productionDay` in ../time/production-day.
 */

export type LoadNumber = {
  /** The sterilizer's number in load numbers: 1 to 6 digits or capital letters. */
  readonly sterilizer: string;
  /** The day it is counted on, YYYY-MM-DD: the facility's production day. */
  readonly day: string;
  /** Count of the day on this sterilizer, from 1. */
  readonly count: number;
};

/** Sterilizer, year and day of the year, count of the day in at least two digits. */
export const defaultLoadNumberPattern = '{sterilizer}-{yy}{ddd}-{nn}';

export const loadNumberPattern = /^[0-9A-Z]+(?:-[0-9A-Z]+)*$/;
export const greatestLoadNumberLength = 20;

const tokens = ['{sterilizer}', '{yyyy}', '{yy}', '{ddd}', '{mm}', '{dd}', '{nnn}', '{nn}'] as const;
type Token = (typeof tokens)[number];

const sterilizerPattern = /^[0-9A-Z]{1,6}$/;
const greatestCount = 9999;

/**
 * Whether a pattern can be used: it names the sterilizer, one full date and the count once each, in capital letters, digits
 * and hyphens, and two loads are never written the same.
 */
export function checkLoadNumberPattern(pattern: string): Result<string, 'not-a-pattern'> {
  const no = (sentence: string) => refuse('not-a-pattern', sentence);
  if (pattern.length > 60) return no('A pattern has at most 60 characters.');
  const used = pattern.match(/\{[^}]*\}?/g) ?? [];
  const unknown = used.find((token) => !(tokens as readonly string[]).includes(token));
  if (unknown !== undefined) return no(`${unknown} stands for nothing in a load number.`);
  const has = (token: Token) => used.filter((one) => one === token).length;
  if (has('{sterilizer}') !== 1) return no('The pattern needs {sterilizer} once.');
  if (has('{nn}') + has('{nnn}') !== 1) return no('The pattern needs the count of the day once, {nn} or {nnn}.');
  if (has('{yy}') + has('{yyyy}') !== 1) return no('The pattern needs the year once, {yy} or {yyyy}.');
  const byDayOfYear = has('{ddd}') === 1 && has('{mm}') === 0 && has('{dd}') === 0;
  const byMonth = has('{ddd}') === 0 && has('{mm}') === 1 && has('{dd}') === 1;
  if (!byDayOfYear && !byMonth) return no('The pattern needs the day once, {ddd} or {mm} and {dd}.');
  if (!loadNumberPattern.test(pattern.replace(/\{[^}]*\}/g, '0'))) {
    return no('Around its parts a pattern has digits, capital letters and single hyphens.');
  }
  if (!/(^|-)\{sterilizer\}(-|$)/.test(pattern) || !/(^|-)\{nnn?\}(-|$)/.test(pattern)) {
    return no('A hyphen has to part {sterilizer} and the count from what stands beside them.');
  }
  const longest = formatLoadNumber({ sterilizer: '000000', day: '2000-12-31', count: greatestCount }, pattern);
  if (longest.length > greatestLoadNumberLength)
    return no(`It can grow beyond ${greatestLoadNumberLength} characters.`);
  return accept(pattern);
}

/**
 * The load number as written. `pattern` has passed `checkLoadNumberPattern`. Throws a RangeError for a sterilizer, day or
 * count that cannot be in a load number: these are made by the program and checked where they are set.
 */
export function formatLoadNumber(load: LoadNumber, pattern: string = defaultLoadNumberPattern): string {
  if (!sterilizerPattern.test(load.sterilizer)) {
    throw new RangeError('A sterilizer has 1 to 6 digits or capital letters in a load number.');
  }
  if (!Number.isInteger(load.count) || load.count < 1 || load.count > greatestCount) {
    throw new RangeError('Loads of a day are counted from 1.');
  }
  return pattern
    .replace('{sterilizer}', load.sterilizer)
    .replace('{yyyy}', load.day.slice(0, 4))
    .replace('{yy}', load.day.slice(2, 4))
    .replace('{ddd}', String(ordinalDay(load.day)).padStart(3, '0'))
    .replace('{mm}', load.day.slice(5, 7))
    .replace('{dd}', load.day.slice(8, 10))
    .replace('{nnn}', String(load.count).padStart(3, '0'))
    .replace('{nn}', String(load.count).padStart(2, '0'));
}
