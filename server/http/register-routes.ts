import {
  greatestImportBytes,
  importPreviewSchema,
  importRequestSchema,
  importResultSchema,
} from '#contract/csv-import';
import type { Permission } from '#domain/access/permissions';
import { z } from 'zod';
import { writeCsv, writeCsvTemplate } from '../platform/csv/write-csv';
import { importFile, listForExport, previewImport } from '../platform/register/import-file';
import type { FiledRegister } from '../platform/register/register';
import { defineRoute, type Route } from './define-route';

const csv = 'text/csv; charset=utf-8' as const;
const upload = { greatestBytes: greatestImportBytes };

/** The four addresses by which a register goes out to a file and comes back from one. */
export function registerFileRoutes<Fields extends object>({
  register,
  path,
  fileName,
  viewing,
  editing,
}: {
  readonly register: FiledRegister<Fields>;
  readonly path: string;
  /** Without its ending: "items". */
  readonly fileName: string;
  readonly viewing: Permission;
  readonly editing: Permission;
}): Route[] {
  return [
    defineRoute({
      method: 'get',
      path: `${path}/export`,
      permission: viewing,
      response: 'file',
      handle: async ({ services, actor }) => ({
        file: writeCsv(register.columns, await listForExport(register, services.db, actor.facilityId)),
        mediaType: csv,
        name: `${fileName}.csv`,
      }),
    }),
    defineRoute({
      method: 'get',
      path: `${path}/import/template`,
      permission: viewing,
      response: 'file',
      handle: () =>
        Promise.resolve({
          file: writeCsvTemplate(register.columns),
          mediaType: csv,
          name: `${fileName}-template.csv`,
        }),
    }),
    defineRoute({
      method: 'post',
      path: `${path}/import/preview`,
      permission: editing,
      upload,
      body: z.strictObject({}),
      response: importPreviewSchema,
      handle: ({ services, actor, file }) => previewImport(register, { desk: services, actor }, file),
    }),
    defineRoute({
      method: 'post',
      path: `${path}/import`,
      permission: editing,
      upload,
      body: importRequestSchema,
      response: importResultSchema,
      handle: ({ services, actor, file, body }) => importFile(register, { desk: services, actor }, { ...body, file }),
    }),
  ];
}
