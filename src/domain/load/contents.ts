import type { LoadView } from './model';

export type Json = null | boolean | number | string | readonly Json[] | { readonly [name: string]: Json };

/**
 * What a load holds, as one value that does not depend on the order in which anything happened: the thing a person
 * signs for when closing. Its canonical JSON is what the digest is made of.
 *
 * Names and measures of items are left out: the codes and ids pin them down, and a corrected spelling in the catalogue
 * must not make an old load look changed. The program's figures are in, because the load was judged by them.
 */
export function contentsOf(view: LoadView): Json {
  const itemCode = new Map(view.items.map((item) => [item.id, item.code]));
  const holderKindCode = new Map(view.holderKinds.map((kind) => [kind.id, kind.code]));
  return {
    form: 'load-contents-1',
    loadId: view.loadId,
    sterilizer: { id: view.sterilizer.id, code: view.sterilizer.code },
    program: {
      id: view.program.id,
      code: view.program.code,
      type: view.program.type,
      temperatureC: view.program.temperatureC,
      exposureS: view.program.exposureS,
      dryS: view.program.dryS,
    },
    cart: { id: view.cart.id, code: view.cart.code },
    holders: sortedBy(view.holders, (holder) => holder.holderId).map((holder) => ({
      holderId: holder.holderId,
      placeCode: holder.placeCode,
      kind: holderKindCode.get(holder.kindId) ?? null,
      shelfId: holder.shelfId,
      xMm: holder.xMm,
      yMm: holder.yMm,
      turn: holder.turn,
    })),
    packages: sortedBy(view.packages, (one) => one.packageId).map((one) => ({
      packageId: one.packageId,
      code: one.code,
      item: itemCode.get(one.itemId) ?? null,
      isScanned: one.isScanned,
      placement: one.placement === null ? null : { ...one.placement },
      expiresOn: one.expiresOn,
      hasExternalIndicator: one.hasExternalIndicator,
      hasInternalIndicator: one.hasInternalIndicator,
    })),
    counts: sortedBy(view.counts, (count) => count.shelfId).map((count) => ({
      shelfId: count.shelfId,
      counted: count.counted,
    })),
    acceptances: sortedBy(view.acceptances, (acceptance) => acceptance.findingKey).map((acceptance) => ({
      findingKey: acceptance.findingKey,
      ruleId: acceptance.ruleId,
      reason: acceptance.reason,
    })),
  };
}

/**
 * JSON text with exactly one spelling per value, by the JSON Canonicalization Scheme (RFC 8785): no white space, names
 * sorted by UTF-16 code units (3.2.3), numbers and strings as ECMAScript writes them (3.2.2.2, 3.2.2.3).
 * @throws RangeError for a number that is not finite or a string with a lone surrogate, which have no canonical form.
 */
export function canonicalJson(value: Json): string {
  if (typeof value === 'number') {
    if (!Number.isFinite(value)) throw new RangeError('A number that is not finite has no canonical form.');
    return JSON.stringify(value);
  }
  if (typeof value === 'string') return canonicalString(value);
  if (value === null || typeof value === 'boolean') return String(value);
  if (isList(value)) return `[${value.map(canonicalJson).join(',')}]`;
  // `<` compares UTF-16 code units, which is what 3.2.3 asks for; localeCompare would not.
  const members = Object.entries(value).sort(([a], [b]) => (a < b ? -1 : a > b ? 1 : 0));
  return `{${members.map(([name, member]) => `${canonicalString(name)}:${canonicalJson(member)}`).join(',')}}`;
}

function canonicalString(text: string): string {
  // With the u flag a surrogate pair is one character, so this finds only lone surrogates.
  if (/\p{Surrogate}/u.test(text)) throw new RangeError('Text with a lone surrogate has no canonical form.');
  return JSON.stringify(text);
}

function isList(value: Exclude<Json, null | boolean | number | string>): value is readonly Json[] {
  return Array.isArray(value);
}

function sortedBy<Value>(values: readonly Value[], key: (value: Value) => string): Value[] {
  return [...values].sort((a, b) => (key(a) < key(b) ? -1 : key(a) > key(b) ? 1 : 0));
}
