import { accept, refuse, type Result } from '../result';
import { checkCharactersOf, hasItsCheckCharacters } from './check-character';
import { greatestLoadNumberLength, loadNumberPattern } from './load-number';
import { asciiUpperCase, symbolTextOf } from './own-code';
import { parsePackageCode } from './package-code';

/*
 * What a load sticker's symbol carries: LP20431784012-26076-0369
 *   L   load sticker
 *   P20431784   the package, without its check digits
 *   01   which printing of the sticker: a reprint makes the one before it void, and a scan of that can be told apart
 *   2-26076-03   the load number as the facility writes it
 *   69   check digits over everything before them
 * 24 characters: an 18 x 18 Data Matrix. Nobody types it; what people read on the sticker are load number and package code.
 */

export type LoadStickerCode = {
  /** As in the symbol. */
  readonly code: string;
  readonly packageCode: string;
  readonly loadNumber: string;
  /** 1 for the first printing. */
  readonly copy: number;
};

export type LoadStickerRefusal = 'foreign' | 'check-character';

export const greatestStickerCopy = 99;

/** The text of a load sticker's symbol. Throws a RangeError where a part is not one: all three are made by the program. */
export function formatLoadStickerCode(sticker: Omit<LoadStickerCode, 'code'>): string {
  const parsed = parsePackageCode(sticker.packageCode);
  if (!parsed.ok) throw new RangeError('A load sticker belongs to a package.');
  if (!loadNumberPattern.test(sticker.loadNumber) || sticker.loadNumber.length > greatestLoadNumberLength) {
    throw new RangeError('A load sticker carries a load number.');
  }
  if (!Number.isInteger(sticker.copy) || sticker.copy < 1 || sticker.copy > greatestStickerCopy) {
    throw new RangeError('Printings of a load sticker are counted from 1 to 99.');
  }
  const packagePart = symbolTextOf(parsed.value.code).slice(0, -2);
  const body = `L${packagePart}${String(sticker.copy).padStart(2, '0')}${sticker.loadNumber}`;
  return body + checkCharactersOf(body);
}

/** Reads the text of a load sticker's symbol. */
export function parseLoadStickerCode(text: string): Result<LoadStickerCode, LoadStickerRefusal> {
  const foreign = refuse('foreign', 'This is not a load sticker.');
  if (text.length > 48) return foreign;
  const code = asciiUpperCase(text.trim());
  if (!/^L[PTKXBC][0-9]{8}/.test(code)) return foreign;
  const match = /^L([PTKXBC][0-9]{8})([0-9]{2})([0-9A-Z-]+)[0-9]{2}$/.exec(code);
  if (match === null || !hasItsCheckCharacters(code)) {
    return refuse('check-character', 'The check digits of this load sticker do not fit. Scan it again.');
  }
  const [packagePart = '', copy = '', loadNumber = ''] = match.slice(1);
  const packageCode = parsePackageCode(packagePart + checkCharactersOf(packagePart));
  if (!packageCode.ok || !loadNumberPattern.test(loadNumber) || Number(copy) < 1) return foreign;
  return accept({ code, packageCode: packageCode.value.code, loadNumber, copy: Number(copy) });
}
