import type { Finding } from '../preflight/finding';
import { canonicalJson } from '../prepare/manifest';
import type { Settings } from '../prepare/settings';
import { routeRefusal } from '../stock/cautions';
import type { Stock } from '../stock/stock';
import { untickedItems } from './checklist';
import type { OrderFields } from './order';
import type { OrderEvent, OrderState } from './state';

/** A designer's decision that a finding of one artwork version may stand. */
export interface Waiver {
  findingId: string;
  artworkVersion: number;
}

/** A preparation as far as the rules look at it. */
export interface PreparationFacts {
  id: number;
  artworkVersion: number;
  taskState: 'waiting' | 'running' | 'done' | 'failed';
  manifestSha256: string | null;
  settings: Settings;
  findings: readonly Finding[];
}

/** What the rules of an order's life look at; the state table is asked apart. */
export interface RuleFacts {
  fields: OrderFields;
  /** null: the blank's stock is not identified */
  stock: Stock | null;
  /** whoever submits for themselves has a confirmed address; staff may submit for a walk-in */
  customerConfirmed: boolean;
  /** the shop has entered its darkening wash with the safety data sheet */
  washOffered: boolean;
  /** state that an order on hold returns to; null where it is not on hold */
  formerState: OrderState | null;
  /** newest artwork version with its check, or null */
  artwork: {
    version: number;
    taskState: 'waiting' | 'running' | 'done' | 'failed';
    findings: readonly Finding[] | null;
  } | null;
  /** settings that a preparation would have now; null while choices are missing */
  currentSettings: Settings | null;
  /** preparation that was passed or is to be passed, or null */
  preparation: PreparationFacts | null;
  waivers: readonly Waiver[];
  passedManifestSha256: string | null;
  approvedManifestSha256: string | null;
}

/** Blockers that no waiver of this artwork version covers; a waiver of what cannot be waived counts for nothing. */
export function openBlockers(
  findings: readonly Finding[],
  waivers: readonly Waiver[],
  artworkVersion: number,
): Finding[] {
  const waived = (finding: Finding): boolean =>
    finding.waivable &&
    waivers.some((w) => w.findingId === finding.id && w.artworkVersion === artworkVersion);
  return findings.filter((finding) => finding.severity === 'blocker' && !waived(finding));
}

const ownUnidentified = (facts: RuleFacts): boolean =>
  facts.stock === null && facts.fields.blank?.source === 'customer';

/** Whether an order goes on hold as it is submitted, and why; null where it need not. */
export function holdOnSubmit(facts: RuleFacts): string | null {
  return ownUnidentified(facts)
    ? 'The material of your own blank is not identified yet. The shop looks at it first, and goes on when it knows what it is.'
    : null;
}

const forbiddenRefusal = ({ stock }: RuleFacts): string | null =>
  stock?.forbidden
    ? `${stock.name} is never engraved here, and that cannot be waived. Choose another stock.`
    : null;

function stockRefusal(facts: RuleFacts): string | null {
  const { fields, stock, washOffered } = facts;
  const forbidden = forbiddenRefusal(facts);
  if (forbidden !== null) return forbidden;
  if (fields.route === 'darkening-wash' && !washOffered) {
    return 'The shop offers no darkening wash while it has no safety data sheet for it. Choose another route.';
  }
  return routeRefusal(stock, fields.route, fields.use);
}

function submitWaits(facts: RuleFacts): string | null {
  const { artwork, fields } = facts;
  if (!facts.customerConfirmed)
    return 'The e-mail address is not confirmed yet. Open the link in the mail that we sent.';
  if (!artwork) return 'There is no artwork yet. Add it first.';
  if (artwork.taskState === 'failed')
    return 'The artwork could not be checked. Have it checked again, or send another file.';
  if (artwork.taskState !== 'done' || !artwork.findings)
    return 'The artwork is still being checked. It takes a few seconds.';
  if (fields.widthMm === null || fields.heightMm === null)
    return 'The size is missing. Say how wide the engraving shall be.';
  if (!fields.blank) return 'The blank is missing. Say what is engraved and how big it is.';
  if (!facts.stock && !ownUnidentified(facts))
    return 'The stock is missing. Choose what the blank is made of.';
  return stockRefusal(facts);
}

function passWaits(facts: RuleFacts): string | null {
  const { artwork, preparation, currentSettings, waivers } = facts;
  const forbidden = forbiddenRefusal(facts);
  if (forbidden !== null) return forbidden;
  if (!preparation || !artwork) return 'Nothing is prepared yet. Prepare it first.';
  if (preparation.taskState === 'failed') return 'The preparation failed. Start it again first.';
  if (preparation.taskState !== 'done' || !preparation.manifestSha256) return 'It is still being prepared.';
  if (preparation.artworkVersion !== artwork.version) return 'There is newer artwork. Prepare again first.';
  if (!currentSettings || canonicalJson(currentSettings) !== canonicalJson(preparation.settings)) {
    return 'Size, blank or choices have changed since. Prepare again first.';
  }
  if (!preparation.settings.recipe)
    return 'Power and speed are missing. Type them and prepare again, so that the operator need not ask.';
  const [blocker, ...others] = openBlockers(preparation.findings, waivers, artwork.version);
  if (!blocker) return null;
  const rest =
    others.length === 0 ? '' : others.length === 1 ? ' and one more' : ` and ${others.length} more`;
  return `Blockers are open: ${blocker.title.toLowerCase()}${rest}. Mend the artwork or change the size${blocker.waivable ? ', or waive with a reason' : ''}.`;
}

function approvalHolds(facts: RuleFacts): string | null {
  if (!facts.passedManifestSha256 || facts.passedManifestSha256 !== facts.approvedManifestSha256) {
    return 'What was approved is not what was passed. Send the proof again.';
  }
  return null;
}

function resumeWaits(facts: RuleFacts): string | null {
  return ownUnidentified(facts) && facts.formerState !== 'draft'
    ? 'Say first what the customer’s blank is made of.'
    : null;
}

/**
 * Why an event that the state table allows must wait, in words that say what to do; null where nothing is in its way.
 * What a person says with the event (reason, checklist, manifest) is looked at by `bodyRefusal`.
 */
export function waitsFor(event: OrderEvent, facts: RuleFacts): string | null {
  switch (event) {
    case 'submit':
      return submitWaits(facts);
    case 'pass':
      return passWaits(facts);
    case 'send-proof':
      return forbiddenRefusal(facts);
    case 'approve-without-proof':
      if (!facts.fields.withoutProof) return 'The customer wants a proof. Send it instead.';
      return forbiddenRefusal(facts);
    case 'release':
      if (!facts.stock) return 'The stock is missing. Choose what the blank is made of.';
      return stockRefusal(facts) ?? approvalHolds(facts);
    case 'resume':
      return resumeWaits(facts);
    default:
      return null;
  }
}

/** Why an approval does not fit: it must name the very manifest that was passed. */
export function approvalRefusal(manifestSha256: string, passedManifestSha256: string | null): string | null {
  return manifestSha256 === passedManifestSha256
    ? null
    : 'The proof has changed since this page was opened. Look at the new one before you approve it.';
}

/** Why an order cannot go on the machine with this checklist. */
export function checklistRefusal(ticked: readonly string[]): string | null {
  const [first] = untickedItems(ticked);
  return first === undefined ? null : `The checklist is not complete. Not ticked: ${first}`;
}

/** Why a finding cannot be waived, or null where it can. */
export function waiverRefusal(findingId: string, findings: readonly Finding[]): string | null {
  const found = findings.filter((finding) => finding.id === findingId);
  if (found.length === 0) return 'There is no such finding on this artwork.';
  if (found.some((finding) => !finding.waivable))
    return `“${found[0].title}” cannot be waived. Change the artwork, the size or the stock.`;
  return null;
}
