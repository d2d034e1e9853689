import type { FieldProblem } from '#domain/catalogue/csv-column';
import type { Actor } from '../actor';
import type { Transaction } from '../db';
import { Conflict, InvalidInput, NotFound } from '../errors';
import { once } from '../once';
import { keyOfKept, lockRegister, type Desk, type Kept, type Register, type WriteContext } from './register';

type Asker = { readonly desk: Desk; readonly actor: Actor };

function refuse(name: string, problems: readonly FieldProblem[]): void {
  const first = problems[0];
  if (first === undefined) return;
  const fields = problems.map((problem) => ({ pointer: `/body/${problem.field ?? ''}`, detail: problem.sentence }));
  throw new InvalidInput(`${name}.not-consistent`, first.sentence, { fields });
}

function contextOf({ desk, actor }: Asker, trx: Transaction, requestId: string): WriteContext {
  return { trx, actor, at: desk.clock.now(), ids: desk.ids, requestId };
}

async function judgeOne<Fields extends object>(
  register: Register<Fields>,
  context: WriteContext,
  { fields, kept }: { readonly fields: Fields; readonly kept: readonly Kept<Fields>[] },
): Promise<void> {
  const judge = await register.judge(context.trx, context.actor.facilityId, kept);
  refuse(register.name, judge([fields]).get(fields) ?? []);
}

/** Adds one thing from a form. */
export async function addOne<Fields extends object, Reply>(
  register: Register<Fields>,
  asker: Asker,
  {
    requestId,
    fields: stated,
    view,
  }: {
    readonly requestId: string;
    readonly fields: Fields;
    readonly view: (trx: Transaction, id: string) => Promise<Reply>;
  },
): Promise<Reply> {
  const { facilityId } = asker.actor;
  return once(
    { ...asker.desk, actor: asker.actor },
    { requestId, act: `${register.name}.add`, body: stated },
    async (trx) => {
      const context = contextOf(asker, trx, requestId);
      const { fields, problems } = register.settle(stated, null);
      refuse(register.name, problems);
      await lockRegister(trx, facilityId, register.name);
      const kept = await register.list(trx, facilityId);
      const key = register.keyOf(fields);
      if (kept.some((thing) => keyOfKept(register, thing) === key)) {
        const sentence = `There is already ${register.aNoun} ${key ?? ''}.`;
        throw new Conflict(`${register.name}.code-taken`, sentence, {
          fields: [{ pointer: `/body/${register.keyField}`, detail: sentence }],
        });
      }
      await judgeOne(register, context, { fields, kept });
      const id = asker.desk.ids.next();
      await register.write(context, [{ before: null, after: { id, version: 1, fields } }]);
      return view(trx, id);
    },
  );
}

/** Puts stated values in the place of kept ones; what is absent stays. */
function withChanges<Fields extends object>(
  fields: Fields,
  changes: { readonly [Field in keyof Fields]?: unknown },
): Fields {
  const stated = Object.entries(changes).filter(([, value]) => value !== undefined);
  return { ...fields, ...Object.fromEntries(stated) };
}

/** Changes one thing from a form that was filled in against `version`. */
export async function changeOne<Fields extends object, Reply>(
  register: Register<Fields>,
  asker: Asker,
  {
    requestId,
    id,
    version,
    changes,
    view,
  }: {
    readonly requestId: string;
    readonly id: string;
    readonly version: number;
    readonly changes: { readonly [Field in keyof Fields]?: Fields[Field] | undefined };
    readonly view: (trx: Transaction, id: string) => Promise<Reply>;
  },
): Promise<Reply> {
  const { facilityId } = asker.actor;
  return once(
    { ...asker.desk, actor: asker.actor },
    { requestId, act: `${register.name}.change`, body: { id, version, changes } },
    async (trx) => {
      const context = contextOf(asker, trx, requestId);
      await lockRegister(trx, facilityId, register.name);
      const kept = await register.list(trx, facilityId);
      const before = kept.find((thing) => thing.id === id);
      if (before === undefined) {
        throw new NotFound(
          `${register.name}.none`,
          `There is no ${register.aNoun.replace(/^an? /, '')} here that was meant.`,
        );
      }
      if (before.version !== version) {
        throw new Conflict(
          `${register.name}.changed-meanwhile`,
          'Somebody else changed this while you were writing. Look at it again, then repeat your change.',
        );
      }
      const { fields, problems } = register.settle(withChanges(before.fields, changes), before.fields);
      refuse(register.name, problems);
      await judgeOne(register, context, { fields, kept });
      if (JSON.stringify(fields) !== JSON.stringify(before.fields)) {
        await register.write(context, [{ before, after: { id, version: version + 1, fields } }]);
      }
      return view(trx, id);
    },
  );
}
