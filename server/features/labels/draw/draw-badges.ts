import { parseBadgeCode } from '#domain/label/badge-code';
import type { LabelPen } from './label-page';
import { badgeForm, layOutLabels, type Printing } from './lay-out-labels';
import { barModuleMm } from './print-measures';
import { barsOf, symbolModules } from './symbol-modules';

/*
 * A staff badge of the size of a bank card. People read the name on it; a scanner reads a number and nothing of the person.
 */

export type Badge = {
  /** As kept: N-48120937-96. */
  readonly code: string;
  readonly name: string;
  readonly role: string;
  readonly facility: string;
};

const left = 6;
const right = 79.6;
const bottom = 49;
const barHeight = 13;

function drawBadge(pen: LabelPen, badge: Badge): void {
  const parsed = parseBadgeCode(badge.code);
  if (!parsed.ok) throw new RangeError('A badge carries the code of a badge.');
  const width = right - left;
  pen.fitted(badge.facility, { x: left, top: 5, width, steps: [[1, 3, 2.4]] });
  for (let x = 0; x < badgeForm.widthMm - 0.5; x += 1.25) pen.rect(x, 10, 0.375, 2.25);
  const nameEnd = pen.fitted(badge.name, {
    x: left,
    top: 16.5,
    width,
    weight: 'bold',
    steps: [
      [1, 6.4, 5],
      [2, 5, 3.4],
    ],
  });
  pen.fitted(badge.role, { x: left, y: nameEnd + 5, width, steps: [[1, 3.4, 2.4]] });
  pen.symbol(symbolModules(barsOf(parsed.value.code)), left, bottom - barHeight, barModuleMm, barHeight);
  pen.text(parsed.value.code, { x: right, y: bottom, size: 3, align: 'right' });
}

/** Badges as a PDF: single pages of 85.6 x 54 mm, or A4 sheets of 2 x 5. */
export function drawBadges(badges: readonly Badge[], printing: Printing): Promise<Buffer> {
  return layOutLabels(badges, { ...printing, form: badgeForm, title: 'Badges' }, drawBadge);
}
