import { randomUUID } from 'node:crypto';
import type { Response } from 'supertest';
import type { ImportPreview } from '../../../src/contract/csv-import';
import type {
  CartOnFile,
  HolderKindOnFile,
  HolderOnFile,
  ProgramOnFile,
  SterilizerOnFile,
} from '../../../src/contract/equipment';
import type { ProblemDetails } from '../../../src/contract/problem';
import { demonstrationHolderKinds } from '../../../seeds/demonstration-equipment-plan';
import { answer, type Answer } from '../../support/answer';
import type { FacilityLetter, TestApp } from '../../support/test-app';

type Stated = Readonly<Record<string, unknown>>;

export function aProgram(code: string, changes: Stated = {}): Stated {
  return {
    code,
    name: `Program ${code}`,
    type: 'dynamic-air-removal',
    temperatureC: 132,
    exposureS: 240,
    dryS: 1800,
    greatestLoadMassKg: null,
    isRetired: false,
    ...changes,
  };
}

export function aSterilizer(number: string, changes: Stated = {}): Stated {
  return {
    code: `ST-${number}`,
    number,
    name: `Sterilizer ${number}`,
    sizeClass: 'large',
    chamberWidthMm: 620,
    chamberDepthMm: 1250,
    chamberHeightMm: 700,
    drainXMm: 280,
    drainYMm: 90,
    greatestLoadMassKg: 100,
    steamLine: 'A',
    hasAirDetector: false,
    needsAirRemovalTest: true,
    serviceState: 'in-service',
    qualifiedPrograms: [],
    otherPrograms: [],
    ...changes,
  };
}

export function aShelf(level: number, changes: Stated = {}): Stated {
  return {
    level,
    name: level === 1 ? 'Lower shelf' : 'Upper shelf',
    widthMm: 560,
    depthMm: 1150,
    clearHeightMm: 340,
    surface: 'wire',
    greatestMassKg: 60,
    isUsable: true,
    ...changes,
  };
}

export function aCart(code: string, changes: Stated = {}): Stated {
  return {
    code,
    name: `Cart ${code}`,
    sizeClass: 'large',
    isUsable: true,
    note: '',
    shelves: [aShelf(1), aShelf(2)],
    ...changes,
  };
}

export function aHolderKind(code: string, changes: Stated = {}): Stated {
  return { ...demonstrationHolderKinds[0], code, ...changes };
}

export function aHolder(name: string, kind: string, changes: Stated = {}): Stated {
  return { name, kind, condition: 'good', ...changes };
}

export type EquipmentBody = ProblemDetails &
  ImportPreview &
  ProgramOnFile &
  Omit<SterilizerOnFile, 'type'> &
  Omit<CartOnFile, 'sizeClass'> &
  Omit<HolderKindOnFile, 'form'> &
  HolderOnFile & {
    readonly programs: ProgramOnFile[];
    readonly sterilizers: SterilizerOnFile[];
    readonly carts: CartOnFile[];
    readonly holderKinds: HolderKindOnFile[];
    readonly holders: HolderOnFile[];
    readonly total: number;
  };

export function answerOf(sent: PromiseLike<Response>): Promise<Answer<EquipmentBody>> {
  return answer<EquipmentBody>(sent);
}

/** Adds a piece of equipment as an engineer does. */
export async function addPiece(
  app: TestApp,
  path: string,
  fields: Stated,
  facility: FacilityLetter = 'A',
): Promise<EquipmentBody> {
  const engineer = await app.as('engineer', facility);
  const { body } = await answerOf(
    engineer
      .post(path)
      .send({ ...fields, requestId: randomUUID() })
      .expect(201),
  );
  return body;
}

const tables = ['programs', 'sterilizers', 'carts', 'shelves', 'holder_kinds', 'holders', 'air_removal_tests'] as const;

/** Everything kept about equipment, to show that a refusal changed nothing. */
export async function equipmentOnFile(app: TestApp): Promise<unknown> {
  const rows = await Promise.all(tables.map((table) => app.db(table).orderBy('id')));
  const panel = await app.db('sterilizer_programs').orderBy(['sterilizer_id', 'program_id']);
  const history = await app
    .db('audit_events')
    .where((either) => {
      void either.whereLike('kind', 'equipment%').orWhereLike('kind', 'air-removal%');
    })
    .count();
  return { rows, panel, history };
}
