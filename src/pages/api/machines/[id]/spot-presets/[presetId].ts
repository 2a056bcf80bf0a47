import { endpoint } from '../../../../../lib/server/http/endpoint';
import { changeSpotPreset, removeSpotPreset } from '../../../../../lib/server/usecases/keep-spot-preset';

export const PATCH = endpoint(
  'PATCH /api/machines/:id/spot-presets/:presetId',
  async ({ person, params, body }) => ({
    machine: await changeSpotPreset(person, params.id, params.presetId, body),
  }),
);

export const DELETE = endpoint(
  'DELETE /api/machines/:id/spot-presets/:presetId',
  async ({ person, params }) => ({
    machine: await removeSpotPreset(person, params.id, params.presetId),
  }),
);
