import { importPreviewSchema, importResultSchema, type ImportMode, type ImportPreview } from '#contract/csv-import';
import { useQueryClient } from '@tanstack/react-query';
import { useState } from 'react';
import { api } from '../../lib/api-client';
import { sentenceOf } from '../../lib/errors';
import { countOf } from '../../lib/format';
import { useAnnounce } from '../ui/announcer';
import { Button } from '../ui/button';
import { Dialog } from '../ui/dialog';
import { FileLink } from '../ui/file-link';
import { FileField } from '../ui/file-field';
import { ImportPreviewView } from './import-preview-view';
import { useWrite } from './use-write';

type ImportSheetProps = {
  /** Address of the list: "/api/items". */
  path: string;
  /** "items" */
  things: string;
  /** What has to be asked for anew once something was imported. */
  queryKey: readonly unknown[];
  onClose: () => void;
};

type Look =
  | { readonly at: 'choosing'; readonly file: File | null; readonly refusal: string | null }
  | { readonly at: 'reading'; readonly file: File }
  | { readonly at: 'seen'; readonly file: File; readonly preview: ImportPreview; readonly refusal: string | null }
  | { readonly at: 'taking'; readonly file: File; readonly preview: ImportPreview };

function formOf(file: File, fields: Readonly<Record<string, string>> = {}): FormData {
  const form = new FormData();
  for (const [name, value] of Object.entries(fields)) form.append(name, value);
  form.append('file', file);
  return form;
}

/** A file is looked at first: what it would add and change, and what is wrong where. Then all of it is imported, or the good rows. */
export function ImportSheet({ path, things, queryKey, onClose }: ImportSheetProps) {
  const [look, setLook] = useState<Look>({ at: 'choosing', file: null, refusal: null });
  const queryClient = useQueryClient();
  const announce = useAnnounce();
  const write = useWrite();

  async function read(file: File | null) {
    if (file === null) return;
    setLook({ at: 'reading', file });
    try {
      const preview = await api.upload(`${path}/import/preview`, formOf(file), importPreviewSchema);
      setLook({ at: 'seen', file, preview, refusal: null });
      announce(`${countOf(preview.rows, 'row')}. ${String(preview.refused)} to put right.`);
    } catch (error) {
      setLook({ at: 'choosing', file, refusal: sentenceOf(error) });
    }
  }

  async function take({ file, preview }: { file: File; preview: ImportPreview }, mode: ImportMode) {
    setLook({ at: 'taking', file, preview });
    try {
      const result = await write((requestId) =>
        api.upload(`${path}/import`, formOf(file, { requestId, mode, digest: preview.digest }), importResultSchema),
      );
      await queryClient.invalidateQueries({ queryKey });
      announce(`Imported: ${String(result.added)} added, ${String(result.changed)} changed.`);
      onClose();
    } catch (error) {
      setLook({ at: 'seen', file, preview, refusal: sentenceOf(error) });
    }
  }

  const isTaking = look.at === 'taking';
  const preview = look.at === 'seen' || look.at === 'taking' ? look.preview : null;
  const moving = preview === null ? 0 : preview.added + preview.changed;
  const refusal = look.at === 'choosing' || look.at === 'seen' ? look.refusal : null;
  return (
    <Dialog
      isOpen
      size="wide"
      title={`Import ${things} from a CSV`}
      onClose={isTaking ? undefined : onClose}
      actions={
        <>
          {preview !== null && moving > 0 && (
            <Button
              waitingWords={isTaking ? 'Importing' : undefined}
              onPress={() => {
                if (look.at === 'seen') void take(look, preview.refused === 0 ? 'all-or-nothing' : 'good-rows');
              }}
            >
              {preview.refused === 0
                ? `Import ${countOf(moving, 'row')}`
                : `Import the ${countOf(moving, 'good row')}, leave the other ${String(preview.refused)}`}
            </Button>
          )}
          <Button kind="quiet" onPress={onClose} blockedBecause={isTaking ? 'It is being done now.' : undefined}>
            Leave it
          </Button>
        </>
      }
    >
      <div className="grid gap-5 pt-1">
        <p className="text-row">
          One line for each, with the columns named on the first. The template explains them; what is here now reads
          back to the same.
        </p>
        <div className="-my-3 -ml-3 flex flex-wrap items-start gap-x-2">
          <FileLink to={`${path}/import/template`} how="save" kind="plain" size="small">
            Save the template
          </FileLink>
          <FileLink to={`${path}/export`} how="save" kind="plain" size="small">
            Save what is here now
          </FileLink>
        </div>
        <FileField
          label="CSV file"
          accept=".csv,.txt,.tsv,text/csv"
          file={look.file}
          error={look.at === 'choosing' ? (refusal ?? undefined) : undefined}
          onChoose={(file) => {
            void read(file);
          }}
        />
        {look.at === 'reading' && <p role="status">Reading {look.file.name}…</p>}
        {preview !== null && <ImportPreviewView preview={preview} />}
        {look.at === 'seen' && refusal !== null && (
          <p role="alert" className="font-semibold text-madder-3">
            {refusal}
          </p>
        )}
      </div>
    </Dialog>
  );
}
