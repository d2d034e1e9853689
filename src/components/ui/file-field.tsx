import { useId, useState, type DragEvent, type ReactNode } from 'react';
import { Icon } from '../icon';
import { describedBy, FieldError } from './field';

type FileFieldProps = {
  label: string;
  hint?: ReactNode;
  error?: string | undefined;
  /** As the `accept` attribute: ".csv,text/csv". */
  accept?: string;
  file: File | null;
  onChoose: (file: File | null) => void;
  className?: string;
};

function sizeInWords(bytes: number): string {
  return bytes < 1024
    ? `${bytes} bytes`
    : bytes < 1024 * 1024
      ? `${Math.round(bytes / 1024)} KB`
      : `${(bytes / 1024 / 1024).toFixed(1)} MB`;
}

/** One file: chosen with a touch or dropped here. */
export function FileField({ label, hint, error, accept, file, onChoose, className = '' }: FileFieldProps) {
  const id = useId();
  const [isOver, setIsOver] = useState(false);

  function drop(event: DragEvent) {
    event.preventDefault();
    setIsOver(false);
    onChoose(event.dataTransfer.files[0] ?? null);
  }

  return (
    <div className={className}>
      <p id={`${id}-label`} className="mb-1 text-small font-medium">
        {label}
      </p>
      {hint !== undefined && (
        <p id={`${id}-hint`} className="mb-1.5 text-small text-ink-2">
          {hint}
        </p>
      )}
      <label
        onDragOver={(event) => {
          event.preventDefault();
          setIsOver(true);
        }}
        onDragLeave={() => {
          setIsOver(false);
        }}
        onDrop={drop}
        className={`flex min-h-16 items-center gap-3 border border-dashed border-paper-edge px-4 py-3 has-focus-visible:outline-3 has-focus-visible:outline-offset-2 has-focus-visible:outline-ink-1 ${isOver ? 'bg-film-1' : 'bg-paper-0'}`}
      >
        <Icon name="file" size={24} className="text-film-4" />
        <span>
          {file === null ? (
            <span className="font-semibold text-film-4">Choose a file, or drop it here</span>
          ) : (
            <>
              <span className="block font-semibold">{file.name}</span>
              <span className="block text-small text-ink-2">{sizeInWords(file.size)}. Touch to choose another.</span>
            </>
          )}
        </span>
        <input
          type="file"
          className="sr-only"
          accept={accept}
          aria-labelledby={`${id}-label`}
          aria-describedby={describedBy(id, { hint, error })}
          aria-invalid={error === undefined ? undefined : true}
          onChange={(event) => {
            onChoose(event.target.files?.[0] ?? null);
            // The same file, put right and chosen again, has to count as a choice.
            event.target.value = '';
          }}
        />
      </label>
      <FieldError id={`${id}-error`} error={error} />
    </div>
  );
}
