import { Button } from '../components/ui/button';

/** A minute before the end. Any touch, key or scan keeps the sign-in going. */
export function IdleNotice({ secondsLeft, personName }: { secondsLeft: number; personName: string }) {
  return (
    <div
      role="status"
      className="fixed right-4 bottom-4 left-4 z-30 flex flex-wrap items-center gap-x-5 gap-y-2 bg-straw-1 px-5 py-3.5 shadow-sheet ring-2 ring-straw-3 ring-inset tablet:left-auto tablet:max-w-120"
    >
      <p className="flex-1 text-row">
        <b className="font-semibold">{personName} will be signed out</b>
        {/* The figure changes each second; a reader hears the sentence once. */}
        <span aria-hidden="true" className="tabular-nums">
          {' '}
          in {secondsLeft} s
        </span>
        . The screen stays as it is.
      </p>
      <Button size="small">Stay</Button>
    </div>
  );
}
