import type { PackageState } from '../load/model';

/** How a package's state is said in a sentence: "It is …". */
export function stateInWords(state: PackageState): string {
  switch (state) {
    case 'packed':
      return 'packed';
    case 'staged':
      return 'staged';
    case 'in-load':
      return 'in a load';
    case 'processed':
      return 'processed and waiting for its proof';
    case 'sterile':
      return 'sterile already';
    case 'quarantined':
      return 'in quarantine';
    case 'stored':
      return 'in sterile storage';
    case 'on-case-cart':
      return 'on a case cart';
    case 'used':
      return 'used';
    case 'returned':
      return 'back for reprocessing';
    case 'recalled':
      return 'called back';
    case 'discarded':
      return 'discarded';
  }
}
