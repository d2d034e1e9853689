import type { IdentifyResponse } from '#contract/packages';
import { readScan } from '#domain/label/read-scan';
import type { Services } from '../../http/define-route';
import type { Actor } from '../../platform/actor';
import { findItemByDeviceIdentifier } from '../items/read-model';
import { facilityDay } from '../../platform/facility-day';
import { findPackageSummary } from './package-read-model';

/** What was scanned at the packing station: the maker's code names an item, our own label a package. Changes nothing. */
export async function identifyScan(services: Services, actor: Actor, raw: string): Promise<IdentifyResponse> {
  const { db, clock } = services;
  const { day } = await facilityDay(db, actor.facilityId, clock.now());
  const scan = readScan(raw, { currentYear: Number(day.slice(0, 4)) });
  switch (scan.kind) {
    case 'device': {
      const item = await findItemByDeviceIdentifier(db, actor.facilityId, scan.deviceIdentifier);
      if (!item) {
        return {
          found: 'nothing',
          sentence: `No item in this catalogue has the device identifier ${scan.deviceIdentifier}. Choose it from the list.`,
        };
      }
      const { id, code, name, kind, isImplant, isRetired } = item;
      return {
        found: 'item',
        item: { id, code, name, kind, isImplant, isRetired },
        sentence: isRetired ? `${code} ${name} is retired and is not packed any more.` : `${code} ${name}.`,
      };
    }
    case 'package': {
      const found = await findPackageSummary(db, actor.facilityId, { code: scan.code }, day);
      return found
        ? { found: 'package', package: found, sentence: `${found.code} is a package of ${found.item.name}.` }
        : { found: 'nothing', sentence: 'No package here has this code.' };
    }
    case 'place':
      return {
        found: 'nothing',
        sentence: 'That is the code of a place on a cart. Scan the maker’s code of the item.',
      };
    case 'badge':
      return { found: 'nothing', sentence: 'That is a badge. Open “Change person” to use it.' };
    case 'load-sticker':
      return { found: 'nothing', sentence: 'That is a load sticker. Scan the package’s own label.' };
    case 'unreadable':
      return { found: 'nothing', sentence: scan.sentence };
  }
}
