import { useState } from 'react';
import { Button } from '../../../components/ui/button';
import { Dialog } from '../../../components/ui/dialog';
import { TextField } from '../../../components/ui/text-field';
import { LazyCameraScanner } from '../../../lib/lazy-camera-scanner';
import type { ScanEntry } from '../../../lib/scanner-input';

type KeyInSheetProps = {
  readonly onCode: (code: string, entry: ScanEntry) => void;
  readonly onClose: () => void;
};

/** When the scanner cannot: type the code, or let the tablet's camera read it. */
export function KeyInSheet({ onCode, onClose }: KeyInSheetProps) {
  const [code, setCode] = useState('');
  const [isCamera, setIsCamera] = useState(false);
  const [problem, setProblem] = useState<string | undefined>(undefined);
  function send() {
    if (code.trim() === '') {
      setProblem('Type the code that stands under the bars.');
      return;
    }
    onCode(code, 'keyed');
    setCode('');
    setProblem(undefined);
  }
  return (
    <Dialog isOpen onClose={onClose} title={isCamera ? 'Read with the camera' : 'Key in a code'} material="film">
      {isCamera ? (
        <LazyCameraScanner
          onScan={(scan) => {
            onCode(scan.text, 'camera');
          }}
        />
      ) : (
        <form
          className="grid gap-4"
          onSubmit={(event) => {
            event.preventDefault();
            send();
          }}
        >
          <TextField
            label="Code"
            isCode
            autoFocus
            value={code}
            hint="As it stands under the bars, such as P-20431784-52. Capitals, hyphens and spaces do not matter."
            error={problem}
            onChange={(event) => {
              setCode(event.target.value);
            }}
          />
          <Button type="submit">Take this code</Button>
        </form>
      )}
      <Button
        kind="plain"
        icon={isCamera ? 'keys' : 'camera'}
        className="mt-3 -ml-3"
        onPress={() => {
          setIsCamera(!isCamera);
        }}
      >
        {isCamera ? 'Key it in instead' : 'Use the camera'}
      </Button>
    </Dialog>
  );
}
