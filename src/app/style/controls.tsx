import { useState } from 'react';
import { Button } from '../../components/ui/button';
import { CheckboxField } from '../../components/ui/checkbox-field';
import { ComboBoxField } from '../../components/ui/combo-box-field';
import { ConfirmDialog } from '../../components/ui/confirm-dialog';
import { Dialog } from '../../components/ui/dialog';
import { FileField } from '../../components/ui/file-field';
import { CountPad } from '../../components/ui/key-pad';
import { PasswordField } from '../../components/ui/password-field';
import { RadioGroupField } from '../../components/ui/radio-group-field';
import { SegmentedChoice } from '../../components/ui/segmented-choice';
import { SelectField } from '../../components/ui/select-field';
import { NumberField, TextAreaField, TextField } from '../../components/ui/text-field';

export function Buttons() {
  const [isAsking, setIsAsking] = useState(false);
  const [isOpen, setIsOpen] = useState(false);
  return (
    <section>
      <h2 className="mt-7 mb-2.5 text-head">Buttons</h2>
      <div className="flex flex-wrap items-center gap-2.5">
        <Button>Close load</Button>
        <Button icon="print">Print labels</Button>
        <Button kind="quiet">Open</Button>
        <Button kind="plain" icon="keys">
          Key in a code
        </Button>
        <Button kind="stop">Take it off</Button>
        <Button kind="by-exception">Release early</Button>
        <Button blockedBecause="Four things hold this load open. The first: turn slot 7 of holder 1.">
          Close load
        </Button>
        <Button waitingWords="Closing">Close load</Button>
        <Button
          kind="quiet"
          size="small"
          onPress={() => {
            setIsOpen(true);
          }}
        >
          A sheet
        </Button>
        <Button
          kind="quiet"
          size="small"
          onPress={() => {
            setIsAsking(true);
          }}
        >
          A question
        </Button>
      </div>
      <Dialog
        isOpen={isOpen}
        onClose={() => {
          setIsOpen(false);
        }}
        title="Slot 7 of holder 1"
        actions={<Button>Turn it</Button>}
      >
        Its film lies against the film of slot 6.
      </Dialog>
      <ConfirmDialog
        isOpen={isAsking}
        onClose={() => {
          setIsAsking(false);
        }}
        title="Let this finding stay?"
        confirmWords="Let it stay"
        waitingWords="Writing it down"
        reason={{
          label: 'Why it may stay',
          hint: 'One sentence. It goes into the load record with your name.',
          isNeeded: true,
        }}
        onConfirm={() => Promise.resolve()}
      >
        X-33 is 12 mm from the side; 25 mm are wanted.
      </ConfirmDialog>
    </section>
  );
}

const items = [
  { id: '1', label: 'Needle holder, 18 cm', note: 'NH-18' },
  { id: '2', label: 'Bone curette, size 3', note: 'BC-03' },
  { id: '3', label: 'Ear speculum set', note: 'ES-01' },
];

export function Fields() {
  const [chosen, setChosen] = useState<string | null>(null);
  const [shown, setShown] = useState<'open' | 'closed' | 'all'>('open');
  const [file, setFile] = useState<File | null>(null);
  return (
    <section>
      <h2 className="mt-7 mb-2.5 text-head">Fields</h2>
      <div className="grid gap-x-10 gap-y-5 tablet:grid-cols-3">
        <TextField label="Name" hint="As on the tray card." defaultValue="Retractor, double-ended" />
        <TextField
          label="Code"
          isCode
          defaultValue="P-20431784-42"
          error="One of the last two digits is wrong. Scan it again."
        />
        <NumberField label="Clear height" unit="mm" defaultValue="260" />
        <SelectField
          label="Sterilizer"
          placeholder="Choose a sterilizer"
          options={[
            { value: '1', label: 'Sterilizer 1' },
            { value: '2', label: 'Sterilizer 2' },
          ]}
        />
        <ComboBoxField label="Item" choices={items} chosenId={chosen} onChoose={setChosen} placeholder="Name or code" />
        <PasswordField label="Password" autoComplete="off" defaultValue="a lantern on the north quay" />
        <RadioGroupField
          label="Paper side"
          name="paper"
          layout="side-by-side"
          defaultValue="left"
          options={[
            { value: 'left', label: 'Left' },
            { value: 'right', label: 'Right' },
          ]}
        />
        <RadioGroupField
          label="Expiry"
          name="expiry"
          defaultValue="event"
          options={[
            { value: 'event', label: 'By event', note: 'Good while whole and dry' },
            { value: 'dated', label: 'By date', note: 'Good until the day on the label' },
          ]}
        />
        <div>
          <CheckboxField label="Internal indicator placed" hint="One in each package" defaultChecked />
          <CheckboxField label="Contents checked" error="Check the contents first." />
          <SegmentedChoice
            label="Which loads"
            value={shown}
            onChange={setShown}
            options={[
              { value: 'open', label: 'Open' },
              { value: 'closed', label: 'Closed' },
              { value: 'all', label: 'All' },
            ]}
          />
        </div>
        <TextAreaField label="Reason" isOptional defaultValue="The third holder is bent; biomed has it." />
        <FileField
          label="Items as CSV"
          hint="With the header row of the sheet."
          accept=".csv"
          file={file}
          onChoose={setFile}
        />
        <CountPad label="Pieces on shelf 2" doneWords="Keep the count" onDone={() => undefined} />
      </div>
    </section>
  );
}
