import type { JudgedAgain } from '../../../src/contract/judged-again';
import type { Role } from '../../../src/domain/access/permissions';
import { answer, type Answer } from '../../support/answer';
import { anId, type TestApp } from '../../support/test-app';
import { countShelf, detailOf, openLoad, scan, stagedRun, type LoadingBay } from './loading-bay';

/** A load of two pouches in a rack, ready to be closed. */
export async function readyLoad(app: TestApp, bay: LoadingBay): Promise<string> {
  const technician = await app.as('technician');
  const { runId, packages } = await stagedRun(app, bay.pouch.id, 2);
  const loadId = await openLoad(technician, bay, { runId });
  await scan(technician, loadId, bay.racks[0].placeCode);
  for (const one of packages) {
    await scan(technician, loadId, one.code, { kind: 'holder', holderId: bay.racks[0].id });
  }
  return loadId;
}

export async function closeLoad(app: TestApp, bay: LoadingBay, loadId: string): Promise<void> {
  const technician = await app.as('technician');
  const { view } = await detailOf(technician, loadId);
  for (const shelf of view.cart.shelves) {
    const isFull = view.holders.some((holder) => holder.shelfId === shelf.id);
    await countShelf(technician, loadId, shelf.id, isFull ? view.packages.length : 0);
  }
  const reply = await technician.post(`/api/loads/${loadId}/close`).send({ requestId: anId() });
  if (reply.status !== 200) throw new Error(reply.text);
}

export async function judgedAgain(
  app: TestApp,
  loadId: string,
  role: Role = 'technician',
): Promise<Answer<JudgedAgain & { readonly code: string; readonly detail: string }>> {
  return answer((await app.as(role)).get(`/api/loads/${loadId}/judged-again`));
}
