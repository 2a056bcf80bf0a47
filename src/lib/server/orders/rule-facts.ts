import type { PreparationFacts, RuleFacts } from '../../orders/rules';
import type { Role } from '../../orders/state';
import type { TaskView } from '../../orders/views';
import { reportSchema, type Report } from '../../prepare/report';
import { settingsSchema } from '../../prepare/settings';
import { checkOf } from '../tables/artworks';
import type { ListedPreparation } from '../tables/preparations';
import type { TaskRow } from '../tables/tasks';
import { currentSettings, type LoadedOrder } from './load-order';
import { artworkSubject, preparationSubject } from './subjects';

/** A task as people see it; one that is gone has been done. */
export function taskView(tasks: readonly TaskRow[], subject: string): TaskView {
  const task = tasks.find((row) => row.subject === subject);
  if (!task || task.state === 'superseded') return { state: 'done', stage: '', progress: 1, problem: '' };
  return { state: task.state, stage: task.stage, progress: task.progress, problem: task.problem };
}

export const reportOf = (row: Pick<ListedPreparation, 'report'>): Report | null =>
  row.report === null ? null : reportSchema.parse(JSON.parse(row.report));

function preparationFacts(order: LoadedOrder, row: ListedPreparation): PreparationFacts {
  return {
    id: row.id,
    artworkVersion: row.artwork_version,
    taskState: taskView(order.tasks, preparationSubject(row.id)).state,
    manifestSha256: row.manifest_sha256,
    settings: settingsSchema.parse(JSON.parse(row.settings)),
    findings: reportOf(row)?.findings ?? [],
  };
}

/**
 * What the rules look at.
 * @param role whoever asks: staff may submit for a walk-in whose address is not confirmed
 * @param preparationId the preparation that an event names; else the passed one, else the newest
 */
export function ruleFacts(order: LoadedOrder, role: Role, preparationId?: number): RuleFacts {
  const artwork = order.artworks.at(-1);
  const wanted = preparationId ?? order.row.passed_preparation_id;
  const preparation =
    wanted === null ? order.preparations[0] : order.preparations.find(({ id }) => id === wanted);
  return {
    fields: order.fields,
    stock: order.stock,
    customerConfirmed: role !== 'customer' || order.customer.confirmed_at !== null,
    washOffered: order.washOffered,
    formerState: order.row.former_state,
    artwork: artwork
      ? {
          version: artwork.version,
          taskState: taskView(order.tasks, artworkSubject(artwork.id)).state,
          findings: checkOf(artwork)?.findings ?? null,
        }
      : null,
    currentSettings: currentSettings(order),
    preparation: preparation ? preparationFacts(order, preparation) : null,
    waivers: order.waivers.map((w) => ({ findingId: w.finding_id, artworkVersion: w.artwork_version })),
    passedManifestSha256: order.row.passed_manifest_sha256,
    approvedManifestSha256: order.row.approved_manifest_sha256,
  };
}
