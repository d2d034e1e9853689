import { asciiUpperCase } from '../label/own-code';
import { hasGs1CheckDigit } from '../label/gs1-check-digit';
import { parseHibc } from '../label/hibc';
import { accept, refuse, type Result } from '../result';

export type DeviceIdentifierRefusal = 'check-digit' | 'check-character' | 'foreign';

// Only a secondary part has a year in it, and that is not looked at here.
const anyYear = 2000;

/**
 * Reads a device identifier as typed or scanned into the one form it is kept and looked up in.
 * A GTIN of 8, 12, 13 or 14 digits becomes 14 digits with zeros in front (GS1 General Specifications, section 3.3.2: AI 01
 * has 14 digits). A HIBC primary symbol loses its "+" and its check character; without them it cannot be checked, and is
 * taken when it has the form of one (FDA UDI formats by issuing agency, version 1.3).
 */
export function readDeviceIdentifier(text: string): Result<string, DeviceIdentifierRefusal> {
  const compact = text.replace(/\s/g, '');
  if (/^\d+$/.test(compact)) {
    if (![8, 12, 13, 14].includes(compact.length)) {
      return refuse('foreign', 'A GTIN has 8, 12, 13 or 14 digits.');
    }
    if (!hasGs1CheckDigit(compact)) {
      return refuse(
        'check-digit',
        'The last digit of this GTIN does not fit the others: one is wrong, or two are swapped.',
      );
    }
    return accept(compact.padStart(14, '0'));
  }
  if (text.trim().startsWith('+')) {
    const hibc = parseHibc(asciiUpperCase(text.trim()), anyYear);
    if (hibc.ok && hibc.value.deviceIdentifier !== null) return accept(hibc.value.deviceIdentifier);
    if (!hibc.ok && hibc.refusal.code === 'check-character') {
      return refuse('check-character', 'The check character of this HIBC does not fit: a character is wrong.');
    }
    return refuse('foreign', 'This is not the primary HIBC of a device.');
  }
  const bare = asciiUpperCase(compact);
  if (/^[A-Z][A-Z0-9]{3}[A-Z0-9]{1,18}[0-9]$/.test(bare)) return accept(bare);
  return refuse('foreign', 'This is neither a GTIN nor a HIBC.');
}
