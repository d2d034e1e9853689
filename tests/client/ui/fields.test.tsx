import { screen, within } from '@testing-library/react';
import { useState } from 'react';
import { useForm } from 'react-hook-form';
import { describe, expect, it, vi } from 'vitest';
import { Button } from '../../../src/components/ui/button';
import { CheckboxField } from '../../../src/components/ui/checkbox-field';
import { ComboBoxField } from '../../../src/components/ui/combo-box-field';
import { FileField } from '../../../src/components/ui/file-field';
import { PasswordField } from '../../../src/components/ui/password-field';
import { RadioGroupField } from '../../../src/components/ui/radio-group-field';
import { SearchField } from '../../../src/components/ui/search-field';
import { SegmentedChoice } from '../../../src/components/ui/segmented-choice';
import { SelectField } from '../../../src/components/ui/select-field';
import { NumberField, TextAreaField, TextField } from '../../../src/components/ui/text-field';
import { readNumber } from '../../../src/lib/format';
import { renderPart } from '../../support/render-app';

describe('the words of a field', () => {
  it('belong to it for a screen reader: name, hint and what is wrong', () => {
    renderPart(<TextField label="Code" hint="As on the tray card." error="Another item has this code." />);
    const field = screen.getByRole('textbox', { name: 'Code' });
    expect(field).toHaveAccessibleDescription('As on the tray card. Another item has this code.');
    expect(field).toBeInvalid();
  });

  it('say nothing of errors while there are none', () => {
    renderPart(<TextField label="Code" />);
    const field = screen.getByRole('textbox', { name: 'Code' });
    expect(field).not.toHaveAccessibleDescription();
    expect(field).toBeValid();
  });

  it.each([
    ['textbox', <TextAreaField key="a" label="Reason" error="Write why." />],
    ['combobox', <SelectField key="b" label="Reason" error="Write why." options={[]} />],
    ['checkbox', <CheckboxField key="c" label="Reason" error="Write why." />],
    ['group', <RadioGroupField key="d" label="Reason" name="reason" error="Write why." options={[]} />],
    [
      'combobox',
      <ComboBoxField key="e" label="Reason" error="Write why." choices={[]} chosenId={null} onChoose={vi.fn()} />,
    ],
  ] as const)('are tied to a %s as well', (role, field) => {
    renderPart(field);
    expect(screen.getByRole(role, { name: 'Reason' })).toHaveAccessibleDescription(/Write why\./);
  });
});

describe('fields in a form', () => {
  type Values = { name: string; massKg: number; program: string; isImplant: boolean; paper: string };

  function ItemForm({ onSave }: { onSave: (values: Values) => void }) {
    const { register, handleSubmit } = useForm<Values>();
    return (
      <form onSubmit={handleSubmit(onSave)}>
        <TextField label="Name" {...register('name')} />
        <NumberField label="Mass" unit="kg" {...register('massKg', { setValueAs: readNumber })} />
        <SelectField
          label="Program"
          placeholder="Choose a program"
          options={[{ value: 'p1', label: '132 °C, 4 min' }]}
          {...register('program')}
        />
        <CheckboxField label="Implant" {...register('isImplant')} />
        <RadioGroupField
          label="Paper side"
          options={[
            { value: 'left', label: 'Left' },
            { value: 'right', label: 'Right', note: 'Against the house rule' },
          ]}
          {...register('paper')}
        />
        <Button type="submit">Keep</Button>
      </form>
    );
  }

  it('hand over what was written, chosen and ticked', async () => {
    const saved = vi.fn<(values: Values) => void>();
    const { user } = renderPart(<ItemForm onSave={saved} />);
    await user.type(screen.getByRole('textbox', { name: 'Name' }), 'Retractor');
    await user.type(screen.getByRole('textbox', { name: 'Mass' }), '7,4');
    await user.selectOptions(screen.getByRole('combobox', { name: 'Program' }), '132 °C, 4 min');
    await user.click(screen.getByRole('checkbox', { name: 'Implant' }));
    await user.click(within(screen.getByRole('group', { name: 'Paper side' })).getByRole('radio', { name: /^Right/ }));
    await user.click(screen.getByRole('button', { name: 'Keep' }));
    expect(saved.mock.calls[0]?.[0]).toEqual({
      name: 'Retractor',
      massKg: 7.4,
      program: 'p1',
      isImplant: true,
      paper: 'right',
    });
  });
});

describe('single fields', () => {
  it('of a password can be looked at and hidden again', async () => {
    const { user } = renderPart(<PasswordField label="Password" defaultValue="a lantern on the quay" />);
    const field = screen.getByLabelText('Password');
    expect(field).toHaveAttribute('type', 'password');
    const eye = screen.getByRole('button', { name: 'Show what is written in Password' });
    await user.click(eye);
    expect(field).toHaveAttribute('type', 'text');
    expect(eye).toHaveAttribute('aria-pressed', 'true');
    await user.click(eye);
    expect(field).toHaveAttribute('type', 'password');
  });

  it('of a search empty themselves with Escape', async () => {
    function Search() {
      const [text, setText] = useState('');
      return <SearchField label="Find an item" value={text} onChange={setText} result="3 of 52" />;
    }
    const { user } = renderPart(<Search />);
    const field = screen.getByRole('searchbox', { name: 'Find an item' });
    await user.type(field, 'tray');
    expect(field).toHaveValue('tray');
    await user.keyboard('{Escape}');
    expect(field).toHaveValue('');
    expect(screen.getByText('3 of 52')).toBeVisible();
  });

  it('of many choices find one by parts of its name, taken with Enter', async () => {
    const chosen = vi.fn();
    const { user } = renderPart(
      <ComboBoxField
        label="Item"
        choices={[
          { id: '1', label: 'Needle holder, 18 cm', note: 'NH-18' },
          { id: '2', label: 'Bone curette, size 3', note: 'BC-03' },
        ]}
        chosenId={null}
        onChoose={chosen}
      />,
    );
    await user.type(screen.getByRole('combobox', { name: 'Item' }), 'cur 03');
    expect(screen.getAllByRole('option')).toHaveLength(1);
    await user.keyboard('{ArrowDown}{Enter}');
    expect(chosen).toHaveBeenCalledWith('2');
  });

  it('of two to four words move with the arrow keys', async () => {
    const changed = vi.fn();
    function Choice() {
      const [value, setValue] = useState<'open' | 'closed'>('open');
      return (
        <SegmentedChoice
          label="Which loads"
          value={value}
          options={[
            { value: 'open', label: 'Open' },
            { value: 'closed', label: 'Closed' },
          ]}
          onChange={(next) => {
            setValue(next);
            changed(next);
          }}
        />
      );
    }
    const { user } = renderPart(<Choice />);
    await user.tab();
    expect(screen.getByRole('radio', { name: 'Open' })).toHaveFocus();
    await user.keyboard('{ArrowRight}');
    expect(changed).toHaveBeenCalledWith('closed');
    expect(screen.getByRole('radio', { name: 'Closed' })).toBeChecked();
  });

  it('of a file take one, say which, and take the same one again', async () => {
    const chosen: (File | null)[] = [];
    function Import() {
      const [file, setFile] = useState<File | null>(null);
      return (
        <FileField
          label="Items as CSV"
          hint="With its header row."
          file={file}
          onChoose={(next) => {
            setFile(next);
            chosen.push(next);
          }}
        />
      );
    }
    const { user } = renderPart(<Import />);
    const field = screen.getByLabelText('Items as CSV');
    expect(field).toHaveAccessibleDescription('With its header row.');
    const csv = new File(['code,name'], 'items.csv');
    await user.upload(field, csv);
    expect(screen.getByText('items.csv')).toBeVisible();
    await user.upload(field, csv);
    expect(chosen).toEqual([csv, csv]);
  });
});
