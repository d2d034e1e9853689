import { hasGs1CheckDigit } from './gs1-check-digit';
import { elementValue, groupSeparator, parseBracketedElements, parseElementString, type ElementString } from './gs1';
import { parseHibc } from './hibc';
import { dayFromYymmdd } from './label-date';
import { parsePackageCode, type PackageCode } from './package-code';
import { symbolTextOf } from './own-code';
import type { SplitScan } from './symbology';
import { unreadable, type UnreadableScan } from './unreadable-scan';

/* What a maker's label says about a device, whichever of the two schemes it uses. */

export type DeviceScan = {
  readonly kind: 'device';
  readonly scheme: 'gs1' | 'hibc';
  /** Which of GS1's keys the identifier is; 'hibc' for labeler, product and unit of measure. */
  readonly identifierKind: 'gtin' | 'grai' | 'giai' | 'hibc';
  /** A GTIN always has 14 digits, whatever the symbol was. */
  readonly deviceIdentifier: string;
  readonly lot: string | null;
  readonly serial: string | null;
  /** YYYY-MM-DD. */
  readonly expires: string | null;
  /** YYYY-MM-DD. */
  readonly made: string | null;
};

/** A package of ours whose symbol also names the item. */
export type OwnPackageInGs1 = { readonly own: PackageCode; readonly gtin: string | null };

/** GS1's identifiers for what a company keeps for itself: 91 to 99. */
const internal = ['91', '92', '93', '94', '95', '96', '97', '98', '99'];

/**
 * Our own package code inside a GS1 symbol: as serial number where the facility gave out the GTIN itself, as company
 * internal information where the GTIN is the maker's. Only exactly as printed, so that a maker's serial number has to look
 * like ours to the last check digit to be taken for it; the GTIN beside it is there to be compared.
 */
function ownPackage(elementString: ElementString): OwnPackageInGs1 | null {
  for (const identifier of ['21', ...internal]) {
    const value = elementValue(elementString, identifier);
    const parsed = value === null ? null : parsePackageCode(value);
    if (parsed?.ok === true && symbolTextOf(parsed.value.code) === value) {
      return { own: parsed.value, gtin: elementValue(elementString, '01') };
    }
  }
  return null;
}

function identifierIn(elementString: ElementString): Pick<DeviceScan, 'identifierKind' | 'deviceIdentifier'> | null {
  for (const [identifier, identifierKind] of [
    ['01', 'gtin'],
    ['8003', 'grai'],
    ['8004', 'giai'],
  ] as const) {
    const deviceIdentifier = elementValue(elementString, identifier);
    if (deviceIdentifier !== null) return { identifierKind, deviceIdentifier };
  }
  return null;
}

function deviceIn(elementString: ElementString, currentYear: number): DeviceScan | OwnPackageInGs1 | UnreadableScan {
  const own = ownPackage(elementString);
  if (own !== null) return own;
  const identifier = identifierIn(elementString);
  if (identifier === null) {
    const isShipping = ['00', '02', '8006', '8026'].some((key) => elementValue(elementString, key) !== null);
    return unreadable(isShipping ? 'shipping' : 'second-half');
  }
  const day = (key: string) => {
    const value = elementValue(elementString, key);
    return value === null ? null : dayFromYymmdd(value, currentYear, true);
  };
  return {
    kind: 'device',
    scheme: 'gs1',
    ...identifier,
    lot: elementValue(elementString, '10'),
    serial: elementValue(elementString, '21'),
    expires: day('17'),
    made: day('11'),
  };
}

function retailDevice(digits: string): DeviceScan {
  const deviceIdentifier = digits.padStart(14, '0');
  const none = { lot: null, serial: null, expires: null, made: null };
  return { kind: 'device', scheme: 'gs1', identifierKind: 'gtin', deviceIdentifier, ...none };
}

/** The start of an element string that a scanner sent without saying so: a key with its digits. */
const bareElementString = /^(?:01\d{14}|00\d{18}|80030\d{13}|8004[0-9A-Z])/;
/** The second symbol of a two-symbol label, likewise: a date followed by lot or serial number. */
const bareSecondHalf = /^1[17]\d{6}(?:1[017]|21).{2,}$/;

/** Reads a maker's GS1 label; null where the scan is nothing of that kind. */
export function readGs1Scan(
  scan: SplitScan,
  currentYear: number,
): DeviceScan | OwnPackageInGs1 | UnreadableScan | null {
  const { content, data } = scan;
  if (content === 'retail' || (content === 'unknown' && /^(?:\d{12}|\d{13}|\d{14})$/.test(data))) {
    if (/^(?:\d{8}|\d{12}|\d{13}|\d{14})$/.test(data) && hasGs1CheckDigit(data)) return retailDevice(data);
    return content === 'retail' ? unreadable('check-character') : null;
  }
  const isSaid = content === 'gs1' || data.startsWith(groupSeparator);
  const isBracketed = /^\(\d/.test(data);
  if (!isSaid && !isBracketed && !bareElementString.test(data)) {
    const looksLikeSecondHalf = bareSecondHalf.test(data) && parseElementString(data).ok;
    return looksLikeSecondHalf ? unreadable('second-half') : null;
  }
  const parsed = isBracketed ? parseBracketedElements(data) : parseElementString(data);
  return parsed.ok ? deviceIn(parsed.value, currentYear) : unreadable(parsed.refusal.code);
}

/** Reads a maker's HIBC label; null where the scan is nothing of that kind. */
export function readHibcScan(data: string, currentYear: number): DeviceScan | UnreadableScan | null {
  const parsed = parseHibc(data, currentYear);
  if (!parsed.ok) {
    if (parsed.refusal.code === 'foreign' || !/^\*?\+/.test(data)) return null;
    return unreadable(parsed.refusal.code);
  }
  const { deviceIdentifier, lot, serial, expires, made } = parsed.value;
  if (deviceIdentifier === null) return unreadable('second-half');
  return { kind: 'device', scheme: 'hibc', identifierKind: 'hibc', deviceIdentifier, lot, serial, expires, made };
}
