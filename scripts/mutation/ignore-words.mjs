import { PluginKind, declareValuePlugin } from '@stryker-mutator/api/plugin';

/** Properties that hold words for people: whether they are well said no test can tell. */
const wordy = new Set(['name', 'reason', 'remedy', 'text', 'label', 'provenance']);

/** Mutants of words are left out; words that a decision hangs on are compared elsewhere and stay in. */
export const strykerPlugins = [
  declareValuePlugin(PluginKind.Ignore, 'words', {
    shouldIgnore(path) {
      const { node } = /** @type {{ node: { type: string, key?: { type: string, name?: string } } }} */ (
        /** @type {unknown} */ (path)
      );
      if (node.type !== 'ObjectProperty' || node.key?.type !== 'Identifier') return undefined;
      return wordy.has(node.key.name ?? '') ? 'Words for people.' : undefined;
    },
  }),
];
