import { useId, type ReactNode } from 'react';
import { Button, ComboBox, Input, Label, ListBox, ListBoxItem, Popover, type Key } from 'react-aria-components';
import { Icon } from '../icon';
import { controlLook, describedBy, FieldError } from './field';

export type ComboBoxChoice = { readonly id: string; readonly label: string; readonly note?: string };

type ComboBoxFieldProps = {
  label: string;
  hint?: ReactNode;
  error?: string | undefined;
  choices: readonly ComboBoxChoice[];
  chosenId: string | null;
  onChoose: (id: string | null) => void;
  placeholder?: string;
  autoFocus?: boolean;
  className?: string;
};

/** One of many: type a part of the name or the note, take it with Enter. */
export function ComboBoxField({
  label,
  hint,
  error,
  choices,
  chosenId,
  onChoose,
  placeholder,
  autoFocus = false,
  className = '',
}: ComboBoxFieldProps) {
  const id = useId();
  return (
    <ComboBox
      className={className}
      defaultItems={choices}
      value={chosenId}
      onChange={(key: Key | null) => {
        onChoose(key === null ? null : String(key));
      }}
      defaultFilter={(text, typed) =>
        typed
          .toLowerCase()
          .split(/\s+/)
          .every((part) => text.toLowerCase().includes(part))
      }
      menuTrigger="focus"
      isInvalid={error !== undefined}
      autoFocus={autoFocus}
      allowsEmptyCollection
    >
      <Label className="mb-1 block text-small font-medium">{label}</Label>
      {hint !== undefined && (
        <p id={`${id}-hint`} className="mb-1.5 text-small text-ink-2">
          {hint}
        </p>
      )}
      <div className="relative">
        <Input
          className={`${controlLook} pr-14`}
          aria-describedby={describedBy(id, { hint, error })}
          {...(placeholder ? { placeholder } : {})}
        />
        <Button className="absolute inset-y-0 right-0 grid w-12 place-items-center text-film-4">
          <Icon name="down" />
        </Button>
      </div>
      <FieldError id={`${id}-error`} error={error} />
      <Popover className="w-(--trigger-width) overflow-auto bg-paper-0 shadow-sheet" offset={2}>
        <ListBox
          className="max-h-[22rem] overflow-auto outline-none"
          renderEmptyState={() => <p className="px-3.5 py-3 text-row text-ink-2">Nothing here is called that.</p>}
        >
          {(choice: ComboBoxChoice) => (
            <ListBoxItem
              id={choice.id}
              textValue={`${choice.label} ${choice.note ?? ''}`.trim()}
              className="flex min-h-12 cursor-pointer items-baseline justify-between gap-4 border-t border-paper-3 px-3.5 py-3 outline-none first:border-t-0 data-[focused]:bg-film-1 data-[selected]:font-semibold"
            >
              <span>{choice.label}</span>
              {choice.note !== undefined && <span className="code text-small text-ink-2">{choice.note}</span>}
            </ListBoxItem>
          )}
        </ListBox>
      </Popover>
    </ComboBox>
  );
}
