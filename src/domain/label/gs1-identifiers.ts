/*
 * The application identifiers of GS1 and the form of what follows each: facts from the GS1 Barcode Syntax Dictionary
 * (GS1 AISBL), arranged here by form. A form is a row of parts: N digits, X the 82 characters of GS1's first set, Y the
 * 39 of its second, Z the 64 of base64url; then the length, "..20" for 1 to 20; then what has to hold: c check digit at
 * the end, d a day (00 allowed), s a day (00 not allowed), z a zero; "?" a part that may be missing.
 */

export type PartRule = 'check-digit' | 'day-or-month' | 'day' | 'zero';

export type ElementPart = {
  readonly characters: RegExp;
  readonly least: number;
  readonly greatest: number;
  readonly rule: PartRule | null;
  readonly mayBeMissing: boolean;
};

export type ElementForm = {
  readonly parts: readonly ElementPart[];
  readonly greatestLength: number;
  /** Its length is fixed by the first two digits, so no separator follows it. */
  readonly endsItself: boolean;
};

const characterSets = {
  N: /^[0-9]*$/,
  X: /^[!"%&'()*+,\-./0-9:;<=>?A-Z_a-z]*$/,
  Y: /^[#\-/0-9A-Z]*$/,
  Z: /^[0-9A-Za-z_\-=]*$/,
} as const;

const rules = { c: 'check-digit', d: 'day-or-month', s: 'day', z: 'zero' } as const;

/** "from-to" for a run of identifiers; measures have a last digit 0 to 5 for the decimal point. */
const measures = ['310-316', '320-337', '340-357', '360-369'];

const endingThemselves: readonly (readonly [form: string, identifiers: readonly string[]])[] = [
  ['N18c', ['00']],
  ['N14c', ['01', '02', '03']],
  ['N6d', ['11', '12', '13', '15', '16', '17']],
  ['N2', ['20']],
  ['N6', measures.flatMap(spread).flatMap((stem) => spread(`${stem}0-${stem}5`))],
  ['N13c', ['410-417']],
];

const needingSeparator: readonly (readonly [form: string, identifiers: readonly string[]])[] = [
  ['X..20', ['10', '21', '22', '243', '254', '420', '4318', '7020-7022', '710-716', '7240', '8002', '8012']],
  ['X..30', ['240', '241', '250', '251', '400', '401', '403', '4308', '4319', '7002', '7023', '8004', '90']],
  ['X..28', ['235']],
  ['N..6', ['242']],
  ['N13c X..17?', ['253']],
  ['N13c N..12?', ['255']],
  ['N..8', ['30', '37']],
  ['N..15', ['3900-3909', '3920-3929', '423', '425']],
  ['N3 N..15', ['3910-3919', '3930-3939']],
  ['N4', ['3940-3943', '8111']],
  ['N6', ['3950-3955', '8005']],
  ['N17c', ['402']],
  ['N3 X..9', ['421']],
  ['N3', ['422', '424', '426']],
  ['X..3', ['427', '7008']],
  ['X..35', ['4300', '4301', '4310', '4311', '4320']],
  ['X..70', ['4302-4306', '4312-4316', '8110', '8112', '8200']],
  ['X2', ['4307', '4317']],
  ['N20', ['4309']],
  ['N1', ['4321-4323']],
  ['N6d N4', ['4324', '4325']],
  ['N6s', ['4326', '7006']],
  ['N6 X1?', ['4330-4333']],
  ['N13', ['7001']],
  ['N6s N4', ['7003']],
  ['N..4', ['7004']],
  ['X..12', ['7005']],
  ['N6s N6s?', ['7007']],
  ['X..10', ['7009']],
  ['X..2', ['7010']],
  ['N6s N4?', ['7011']],
  ['N3 X..27', ['7030-7039']],
  ['N1 X3', ['7040']],
  ['X2 X..28', ['7230-7239']],
  ['N2', ['7241']],
  ['X..25', ['7242', '8013', '8020']],
  ['N14', ['8001']],
  ['N1z N13c X..16?', ['8003']],
  ['N14c N4', ['8006', '8026']],
  ['X..34', ['8007']],
  ['N8 N..4?', ['8008']],
  ['X..50', ['8009']],
  ['Y..30', ['8010']],
  ['N..12', ['8011']],
  ['N18c', ['8017', '8018']],
  ['N..10', ['8019']],
  ['Z..90', ['8030']],
  ['X..90', ['91-99']],
];

function spread(run: string): string[] {
  const [from = '', to = from] = run.split('-');
  const identifiers: string[] = [];
  for (let number = Number(from); number <= Number(to); number += 1) {
    identifiers.push(String(number).padStart(from.length, '0'));
  }
  return identifiers;
}

function partOf(text: string): ElementPart {
  const match = /^([NXYZ])(\.\.)?(\d+)([cdsz])?(\?)?$/.exec(text);
  if (match === null) throw new TypeError(`Not a part of an element: ${text}`);
  const greatest = Number(match[3]);
  return {
    characters: characterSets[match[1] as keyof typeof characterSets],
    least: match[2] === undefined ? greatest : 1,
    greatest,
    rule: match[4] === undefined ? null : rules[match[4] as keyof typeof rules],
    mayBeMissing: match[5] !== undefined,
  };
}

function formOf(text: string, endsItself: boolean): ElementForm {
  const parts = text.split(' ').map(partOf);
  return { parts, greatestLength: parts.reduce((sum, part) => sum + part.greatest, 0), endsItself };
}

function tableOf(rows: typeof endingThemselves, endsItself: boolean): [string, ElementForm][] {
  return rows.flatMap(([form, runs]) => {
    const shared = formOf(form, endsItself);
    return runs.flatMap(spread).map((identifier): [string, ElementForm] => [identifier, shared]);
  });
}

const forms: ReadonlyMap<string, ElementForm> = new Map([
  ...tableOf(endingThemselves, true),
  ...tableOf(needingSeparator, false),
]);

/** The form of what follows an application identifier; undefined for one that GS1 has not given out. */
export function elementFormOf(identifier: string): ElementForm | undefined {
  return forms.get(identifier);
}

/** The application identifier at the start of a text: two, three or four digits. No assigned one begins with another. */
export function leadingIdentifier(text: string): string | null {
  for (const length of [2, 3, 4]) {
    const identifier = text.slice(0, length);
    if (forms.has(identifier)) return identifier;
  }
  return null;
}
