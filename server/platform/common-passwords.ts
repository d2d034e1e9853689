import { dictionary } from '@zxcvbn-ts/language-common';

let common: ReadonlySet<string> | undefined;

/** Some 49,000 passwords from leaks, most used first, as the package ships them; unpacked when first asked for. */
export function isCommonPassword(text: string): boolean {
  common ??= new Set(dictionary['passwords-common']);
  return common.has(text);
}
