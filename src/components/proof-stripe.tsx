import { useState } from 'react';
import { Icon, type IconName } from './icon';

export type StretchState = 'not-yet' | 'waiting' | 'proven' | 'look-again' | 'failed' | 'not-asked' | 'by-exception';

/** One requirement of a load, as a stretch of its stripe. */
export type Stretch = {
  /** "Air removal", "Loading", "Cycle", "External CI", "Internal CI", "PCD", "BI", "Dry", "Implants", "Signed". */
  readonly label: string;
  readonly state: StretchState;
  /** The fact, in a few words: "31 of 31", "passed 05:48", "reads 11:02". Without it the state itself is said. */
  readonly words?: string;
  /** How much wider than the others: the stretch one works on has more to say. */
  readonly share?: number;
};

const stateWords: Readonly<Record<StretchState, string>> = {
  'not-yet': 'not yet',
  waiting: 'waiting',
  proven: 'proven',
  'look-again': 'look again',
  failed: 'failed',
  'not-asked': 'not asked',
  'by-exception': 'by exception',
};

const stateMarks: Readonly<Partial<Record<StretchState, IconName>>> = {
  waiting: 'wait',
  proven: 'tick',
  failed: 'cross',
  'by-exception': 'tick',
};

/** "proven" is said to screen readers where only the colour and the mark say it to the eye. */
function spokenState({ state, words }: Stretch): string | null {
  return words === undefined || words === stateWords[state] ? null : stateWords[state];
}

function isShut(state: StretchState): boolean {
  return state === 'proven' || state === 'by-exception';
}

/** Welds and tears once, when the state changes before one's eyes; not at first sight. */
function useChange(state: StretchState): string {
  const [shown, setShown] = useState({ state, motion: '' });
  if (shown.state !== state) {
    const motion = isShut(state) && !isShut(shown.state) ? 'animate-weld' : state === 'failed' ? 'animate-tear' : '';
    setShown({ state, motion });
  }
  return shown.motion;
}

function StretchInRow({ stretch }: { stretch: Stretch }) {
  const { label, state, words, share = 1 } = stretch;
  const motion = useChange(state);
  const mark = stateMarks[state];
  const spoken = spokenState(stretch);
  return (
    <li
      className={`stretch stretch-${state} ${state === 'failed' ? 'torn' : ''} ${motion}`}
      style={{ flexGrow: share }}
    >
      <b
        className={`block truncate text-small leading-4 ${mark === undefined ? '' : 'pr-3.5'} ${state === 'not-asked' ? 'font-medium' : 'font-label'}`}
      >
        {label}
      </b>
      <span className="block truncate text-least font-normal">
        {words ?? stateWords[state]}
        {spoken !== null && <span className="sr-only">, {spoken}</span>}
      </span>
      {mark && (
        <Icon
          name={mark}
          size={15}
          className={`absolute top-[7px] ${state === 'failed' ? 'right-3.5' : 'right-[7px]'}`}
        />
      )}
    </li>
  );
}

function StretchUpright({ stretch }: { stretch: Stretch }) {
  const { label, state, words } = stretch;
  const mark = stateMarks[state];
  const spoken = spokenState(stretch);
  return (
    <li
      className={`upright upright-${state} grid grid-cols-[6rem_1fr_1.125rem] items-center gap-2 py-[2.5px] text-row ${state === 'failed' ? 'font-semibold text-madder-4' : state === 'not-asked' || state === 'not-yet' ? 'text-ink-2' : ''}`}
    >
      <b className="font-semibold">{label}</b>
      <span>
        {words ?? stateWords[state]}
        {spoken !== null && <span className="sr-only">, {spoken}</span>}
      </span>
      {mark && <Icon name={mark} size={16} className={state === 'failed' ? 'text-madder-3' : 'text-film-4'} />}
    </li>
  );
}

type ProofStripeProps = {
  stretches: readonly Stretch[];
  /** full: across a load's head. upright: a list on the phone. */
  form?: 'full' | 'upright';
  label?: string;
};

/** Each requirement is a stretch; proving one welds it shut. Unbroken is a released load, torn a failed one. */
export function ProofStripe({ stretches, form = 'full', label = 'Proof stripe' }: ProofStripeProps) {
  return form === 'upright' ? (
    <ol aria-label={label}>
      {stretches.map((stretch) => (
        <StretchUpright key={stretch.label} stretch={stretch} />
      ))}
    </ol>
  ) : (
    <ol aria-label={label} className="stripe flex h-12">
      {stretches.map((stretch) => (
        <StretchInRow key={stretch.label} stretch={stretch} />
      ))}
    </ol>
  );
}

/** For lists: the shape alone, hidden from screen readers. Always put the words beside it. */
export function TinyProofStripe({ states, width = 110 }: { states: readonly StretchState[]; width?: number }) {
  return (
    <span className="inline-flex h-3 flex-none align-[-1px]" style={{ width }} aria-hidden="true">
      {states.map((state, at) => (
        <i key={at} className={`tiny tiny-${state} block`} />
      ))}
    </span>
  );
}
