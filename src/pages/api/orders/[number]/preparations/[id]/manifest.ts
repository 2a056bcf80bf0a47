import { manifestSchema } from '@/lib/prepare/manifest';
import { AppError } from '@/lib/server/errors';
import { endpoint } from '@/lib/server/http/endpoint';
import { findPreparation } from '@/lib/server/usecases/fetch-file';

export const GET = endpoint(
  'GET /api/orders/:number/preparations/:id/manifest',
  async ({ person, params }) => {
    const { manifest } = await findPreparation(person, params.number, params.id);
    if (manifest === null) throw new AppError('not-found');
    return manifestSchema.parse(JSON.parse(manifest));
  },
);
