import { accept, refuse, type Result } from '../result';
import { hasGs1CheckDigit } from './gs1-check-digit';
import { elementFormOf, leadingIdentifier, type ElementForm, type PartRule } from './gs1-identifiers';
import { dayFromYymmdd } from './label-date';

/*
 * Reading GS1 element strings (GS1 General Specifications, section 7.8, by way of the GS1 Barcode Syntax Dictionary and
 * the tests of the GS1 Barcode Syntax Engine).
 */

/** Ends an element of variable length: the character a scanner sends for FNC1 inside a symbol. */
export const groupSeparator = '\u001d';

export type Gs1Element = { readonly identifier: string; readonly value: string };

export type ElementString = {
  readonly elements: readonly Gs1Element[];
  /** Elements whose identifier GS1 has not given out, as they stand: kept, not understood. */
  readonly unread: readonly string[];
};

export type Gs1Refusal = 'damaged' | 'check-character' | 'foreign';

const damaged = refuse('damaged', 'Part of this label makes no sense. Scan again, or scan its other symbol.');
const wrongCheckDigit = refuse('check-character', 'The check digit of this label does not fit. Scan again.');

/** A day is only looked at for being one, and that does not depend on the century except for 29 February. */
const anyLeapCentury = 2000;

function holds(rule: PartRule, value: string): boolean {
  switch (rule) {
    case 'check-digit':
      return hasGs1CheckDigit(value);
    case 'day-or-month':
      return dayFromYymmdd(value, anyLeapCentury, true) !== null;
    case 'day':
      return dayFromYymmdd(value, anyLeapCentury, false) !== null;
    case 'zero':
      return /^0+$/.test(value);
  }
}

/** Whether a value has the form its identifier asks for. */
function checkValue(form: ElementForm, value: string): Result<null, Gs1Refusal> {
  let rest = value;
  for (const part of form.parts) {
    const taken = rest.slice(0, part.greatest);
    rest = rest.slice(part.greatest);
    if (taken.length === 0 && part.mayBeMissing) continue;
    if (taken.length < part.least || !part.characters.test(taken)) return damaged;
    if (part.rule !== null && !holds(part.rule, taken)) {
      return part.rule === 'check-digit' ? wrongCheckDigit : damaged;
    }
  }
  return rest.length === 0 ? accept(null) : damaged;
}

/** Adds an element; the same one twice is harmless when it says the same, and nonsense when it does not. */
function add(elements: Gs1Element[], element: Gs1Element): boolean {
  const earlier = elements.find((known) => known.identifier === element.identifier);
  if (earlier === undefined) elements.push(element);
  return earlier === undefined || earlier.value === element.value;
}

/**
 * Reads an element string without its symbology identifier: "01...", with or without a separator in front, and with
 * separators where they are needed or merely tolerated. Every value is checked: length, characters, check digit, day.
 * An identifier GS1 has not given out is kept unread up to the next separator, unless nothing before it was understood.
 */
export function parseElementString(text: string): Result<ElementString, Gs1Refusal> {
  const elements: Gs1Element[] = [];
  const unread: string[] = [];
  let at = 0;
  while (at < text.length) {
    if (text.charAt(at) === groupSeparator) {
      at += 1;
      continue;
    }
    const separator = text.indexOf(groupSeparator, at);
    const end = separator < 0 ? text.length : separator;
    const identifier = leadingIdentifier(text.slice(at, at + 4));
    const form = identifier === null ? undefined : elementFormOf(identifier);
    if (identifier === null || form === undefined) {
      if (elements.length === 0) return refuse('foreign', 'This label begins with something GS1 has not given out.');
      unread.push(text.slice(at, end));
      at = end;
      continue;
    }
    const start = at + identifier.length;
    at = form.endsItself ? Math.min(start + form.greatestLength, end) : end;
    const value = text.slice(start, at);
    const checked = checkValue(form, value);
    if (!checked.ok) return checked;
    if (!add(elements, { identifier, value })) return damaged;
  }
  return elements.length === 0 ? refuse('foreign', 'There is nothing in this label.') : accept({ elements, unread });
}

/**
 * Reads the form printed for people: "(01)09501101530003(10)A1". An opening bracket inside a value is written "\(", as the
 * GS1 Barcode Syntax Engine does.
 */
export function parseBracketedElements(text: string): Result<ElementString, Gs1Refusal> {
  const elements: Gs1Element[] = [];
  const unread: string[] = [];
  for (const piece of text.split(/(?<!\\)(?=\()/)) {
    const match = /^\((\d{2,4})\)(.+)$/.exec(piece);
    if (match === null) return damaged;
    const [identifier = '', value = ''] = [match[1], match[2]?.replaceAll('\\(', '(')];
    const form = elementFormOf(identifier);
    if (form === undefined) {
      if (elements.length === 0) return refuse('foreign', 'This label begins with something GS1 has not given out.');
      unread.push(identifier + value);
      continue;
    }
    const checked = checkValue(form, value);
    if (!checked.ok) return checked;
    if (!add(elements, { identifier, value })) return damaged;
  }
  return accept({ elements, unread });
}

/** The value that follows an identifier, or null where the label does not hold it. */
export function elementValue(elementString: ElementString, identifier: string): string | null {
  return elementString.elements.find((element) => element.identifier === identifier)?.value ?? null;
}
