import type TestAgent from 'supertest/lib/agent';
import { anId, type TestApp } from '../../support/test-app';
import { answerOf } from './items-support';

export const header = 'code,name,kind,packaging,length_mm,width_mm,height_mm,mass_kg,metal_mass_kg,pose,cycles,service';
export const cycles = 'dynamic-air-removal 132 C 240 s dry 1800 s';

/** One good line of a file; `changes` are cells by place in the header. */
export function row(code: string, changes: Readonly<Record<string, string>> = {}): string {
  const cells: Record<string, string> = {
    code,
    name: `Tray ${code}`,
    kind: 'wrapped-tray',
    packaging: 'wrap',
    length_mm: '500',
    width_mm: '260',
    height_mm: '90',
    mass_kg: '3.4',
    metal_mass_kg: '3',
    pose: 'flat',
    cycles,
    service: 'OR',
    ...changes,
  };
  return header
    .split(',')
    .map((column) => cells[column] ?? '')
    .join(',');
}

export function fileOf(...rows: string[]): string {
  return [header, ...rows, ''].join('\r\n');
}

export type File = string | Buffer;

function bytesOf(file: File): Buffer {
  return typeof file === 'string' ? Buffer.from(file) : file;
}

/** A file looked at and taken over, as the lead does it. */
export function itemFiles(app: TestApp) {
  async function preview(file: File, agent?: TestAgent) {
    const lead = agent ?? (await app.as('lead'));
    return answerOf(lead.post('/api/items/import/preview').attach('file', bytesOf(file), 'items.csv'));
  }

  async function take(
    file: File,
    mode: string,
    { requestId = anId(), digest }: { requestId?: string; digest?: string } = {},
  ) {
    const lead = await app.as('lead');
    const seen = digest ?? (await preview(file)).body.digest;
    return answerOf(
      lead
        .post('/api/items/import')
        .field({ requestId, mode, digest: seen })
        .attach('file', bytesOf(file), 'items.csv'),
    );
  }

  return { preview, take };
}
