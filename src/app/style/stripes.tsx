import { ProofStripe, TinyProofStripe, type Stretch, type StretchState } from '../../components/proof-stripe';
import { Button } from '../../components/ui/button';
import { useState } from 'react';

const labels = [
  'Air removal',
  'Loading',
  'Cycle',
  'External CI',
  'Internal CI',
  'PCD',
  'BI',
  'Dry',
  'Implants',
  'Signed',
] as const;

const letters: Readonly<Record<string, StretchState>> = {
  p: 'proven',
  w: 'waiting',
  b: 'not-yet',
  x: 'failed',
  l: 'look-again',
  n: 'not-asked',
  e: 'by-exception',
};

type Example = {
  readonly name: string;
  readonly note: string;
  readonly states: string;
  readonly words: Readonly<Record<number, string>>;
};

const examples: readonly Example[] = [
  {
    name: 'Loading',
    note: 'Cart open, being scanned and placed',
    states: 'pwbbbbbbnb',
    words: { 0: 'passed 05:48', 1: '24 of 33', 8: 'none listed' },
  },
  {
    name: 'In the sterilizer',
    note: 'Door shut, cycle running',
    states: 'ppwbbbbbnb',
    words: { 2: 'dry, 12 min left', 8: 'none listed' },
  },
  {
    name: 'Cooling',
    note: 'Door open, hands off',
    states: 'pppppwwwnb',
    words: { 5: 'read the CI', 6: 'reads 11:02', 7: 'cool to 11:25' },
  },
  { name: 'Ready to sign', note: 'Every proof in', states: 'ppppppnpnb', words: { 9: 'your turn' } },
  { name: 'Released', note: 'Unbroken, end to end', states: 'ppppppnpnp', words: { 9: '09:52 J. Prusak' } },
  {
    name: 'Released, implant early',
    note: 'BI came after the signature',
    states: 'ppppppppep',
    words: { 8: '2 early, 10:43', 6: 'negative 11:02', 9: '11:06 J. Prusak' },
  },
  {
    name: 'Failed',
    note: 'Torn where it failed',
    states: 'pppppxnbnl',
    words: { 5: 'CI did not turn', 9: 'cannot sign' },
  },
  {
    name: 'Set aside',
    note: 'Signed once, taken back',
    states: 'ppppppxpel',
    words: { 6: 'grew', 8: '1 early', 9: 'set aside 10:14' },
  },
];

function statesOf(example: Example): StretchState[] {
  return Array.from(example.states).map((letter) => letters[letter] ?? 'not-yet');
}

function stretchesOf(example: Example): Stretch[] {
  return statesOf(example).map((state, at) => {
    const words = example.words[at];
    return { label: labels[at] ?? '', state, ...(words === undefined ? {} : { words }) };
  });
}

export function Stripes() {
  return (
    <section>
      <h2 className="mt-6 mb-2.5 text-head">A load, from open to set aside</h2>
      <div className="grid items-center gap-x-5 gap-y-2.5 tablet:grid-cols-[13.75rem_minmax(0,1fr)]">
        {examples.map((example) => (
          <div key={example.name} className="contents">
            <div>
              <b className="block font-label">{example.name}</b>
              <span className="text-small text-ink-2">{example.note}</span>{' '}
              <TinyProofStripe states={statesOf(example)} />
            </div>
            <div className="max-tablet:hidden">
              <ProofStripe stretches={stretchesOf(example)} label={`${example.name}, proof stripe`} />
            </div>
          </div>
        ))}
      </div>
      <Welding />
      <h3 className="mt-5 mb-2 text-head">Upright, on the phone</h3>
      <div className="grid gap-6 tablet:grid-cols-3">
        {[examples[1], examples[5], examples[7]].map(
          (example) =>
            example && (
              <ProofStripe
                key={example.name}
                form="upright"
                stretches={stretchesOf(example)}
                label={`${example.name}, upright`}
              />
            ),
        )}
      </div>
    </section>
  );
}

/** For looking at the weld and the tear as they happen. */
function Welding() {
  const [state, setState] = useState<StretchState>('waiting');
  return (
    <div className="mt-4 grid grid-cols-[1fr_auto_auto_auto] items-center gap-2.5 max-tablet:hidden">
      <ProofStripe
        label="Watch it weld"
        stretches={[
          { label: 'Cycle', state: 'proven' },
          { label: 'PCD', state },
          { label: 'BI', state: 'not-yet' },
        ]}
      />
      {(['waiting', 'proven', 'failed'] as const).map((one) => (
        <Button
          key={one}
          kind="quiet"
          size="small"
          onPress={() => {
            setState(one);
          }}
        >
          {one}
        </Button>
      ))}
    </div>
  );
}
