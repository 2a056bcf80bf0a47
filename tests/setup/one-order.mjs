// The main job through the JSON endpoints: one order from upload to handed over, by four people.
import { createHash } from 'node:crypto';
import { ApiClient } from './api-client.mjs';

const latest = (order) =>
  order.artworks.reduce((best, item) => (item.version > (best?.version ?? 0) ? item : best), null);

/**
 * @param {{base: string, people: {role: string, email: string, password: string}[], artwork: {name: string, bytes: Uint8Array, mediaType: string, widthMm: number, heightMm: number}, treatment: string, screen?: string}} story
 * @returns what was delivered: the order, the preparation and the bytes of every file, their hashes checked
 */
export async function carryOneOrder({
  base,
  people,
  artwork,
  treatment,
  screen = 'published:floyd-steinberg-1976',
}) {
  const as = {};
  for (const role of ['customer', 'designer', 'operator']) {
    const person = people.find((item) => item.role === role);
    as[role] = new ApiClient(base);
    await as[role].signIn(person.email, person.password);
  }

  const { stocks } = await as.customer.get('/api/stocks');
  const stock = stocks.find((item) => !item.forbidden && !item.retired && item.direction === 'darkens');
  let { order } = await as.customer.send('POST', '/api/orders', { title: `Proof of ${artwork.name}` });
  const path = `/api/orders/${order.number}`;
  await as.customer.upload(`${path}/artwork`, artwork.name, artwork.bytes, artwork.mediaType);
  ({ order } = await as.customer.get(path));
  await as.customer.send('PATCH', path, {
    version: order.version,
    fields: {
      widthMm: artwork.widthMm,
      heightMm: artwork.heightMm,
      treatment,
      shadeLstar: 38,
      blank: {
        outline: 'rectangle',
        widthMm: artwork.widthMm + 40,
        heightMm: artwork.heightMm + 40,
        thicknessMm: stock.thicknessMm,
        stockId: stock.id,
        side: 'front',
        grainDeg: 0,
        source: 'shop',
        condition: '',
        spare: false,
      },
      placement: { datum: 'centre', xMm: 0, yMm: 0, quarterTurns: 0, fixture: '' },
    },
  });
  await as.customer.orderWhen(
    order.number,
    (item) =>
      latest(item)?.task.state === 'done' &&
      Math.abs((latest(item).check?.widthMm ?? 0) - artwork.widthMm) < 0.01,
    'the check of the artwork',
  );
  const cause = async (who, body) => {
    const { order: now } = await as[who].get(path);
    return (await as[who].send('POST', `${path}/events`, { version: now.version, ...body })).order;
  };

  await cause('customer', { event: 'submit', rightsConfirmed: true });
  order = await cause('designer', { event: 'take' });

  const { machines } = await as.designer.get('/api/machines');
  const machine = machines.find((item) => !item.retired && item.spotPresets.length > 0);
  const spot = machine.spotPresets[0];
  const pitch = spot.heightMm;
  await as.designer.send('PUT', `${path}/design`, {
    version: order.version,
    design: {
      machineId: machine.id,
      spotPresetId: spot.id,
      treatment,
      screen,
      scan: { directionDeg: 0, linePitchMm: pitch, alongPitchMm: pitch },
      perpendicular: null,
      tone: { mode: 'scaled', blackPoint: 0, whitePoint: 1, gamma: 1 },
      dividingLstar: 53.4,
      corners: 'kept',
      mirror: false,
      recipe: {
        powerPercent: 30,
        speedMmPerS: Math.min(100, machine.maxSpeedMmPerS),
        perpendicular: null,
        focusOffsetMm: 0,
      },
    },
  });
  ({ order } = await as.designer.get(path));
  await as.designer.send('POST', `${path}/preparations`, { version: order.version });
  order = await as.designer.orderWhen(
    order.number,
    (item) => ['done', 'failed'].includes(item.preparations[0]?.task.state),
    'the preparation',
  );
  const [preparation] = order.preparations;
  if (preparation.task.state !== 'done')
    throw new Error(`the preparation failed: ${preparation.task.problem}`);
  for (const finding of preparation.report.findings.filter(
    (item) => item.severity === 'blocker' && item.waivable,
  )) {
    const { order: now } = await as.designer.get(path);
    await as.designer.send('POST', `${path}/waivers`, {
      version: now.version,
      findingId: finding.id,
      reason: 'agreed with the customer',
    });
  }
  await cause('designer', { event: 'pass', preparationId: preparation.id });
  await cause('designer', { event: 'send-proof' });
  await cause('customer', { event: 'approve', manifestSha256: preparation.manifestSha256 });
  await cause('designer', { event: 'release' });

  const { order: ticket } = await as.operator.get(`${path}/ticket`);
  if (ticket.number !== order.number) throw new Error('the ticket is of another order');
  const files = [];
  for (const file of preparation.files) {
    const bytes = await as.operator.download(file.url);
    const sha256 = createHash('sha256').update(bytes).digest('hex');
    if (sha256 !== file.sha256) throw new Error(`${file.name} arrives with other bytes than were passed`);
    files.push({ ...file, data: bytes });
  }
  if (files.length === 0) throw new Error('no file was delivered');
  await cause('operator', {
    event: 'on-the-machine',
    checklist: ['material', 'focus', 'extraction', 'attended'],
  });
  await cause('operator', { event: 'done', words: 'Even, as on the proof', measuredLstar: null });
  order = await cause('operator', { event: 'hand-over', how: 'collected', byWhom: 'the customer' });
  if (order.state !== 'handed-over') throw new Error(`the order ended ${order.state}`);
  return { order, preparation, files };
}
