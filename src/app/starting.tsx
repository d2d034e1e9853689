import { WaitingState } from '../components/ui/states';

/** While the first screen is on its way. */
export function Starting() {
  return (
    <div className="bg-fibre grid h-dvh content-start bg-paper-1 p-6">
      <WaitingState
        title="Paperside is starting"
        waitsFor="The server has not answered yet. It is asked again by itself."
      />
    </div>
  );
}
