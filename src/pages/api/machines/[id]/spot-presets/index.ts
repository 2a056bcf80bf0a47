import { endpoint } from '../../../../../lib/server/http/endpoint';
import { addSpotPreset } from '../../../../../lib/server/usecases/keep-spot-preset';

export const POST = endpoint('POST /api/machines/:id/spot-presets', async ({ person, params, body }) => ({
  machine: await addSpotPreset(person, params.id, body),
}));
