import { AppError } from '@/lib/server/errors';
import { endpoint } from '@/lib/server/http/endpoint';
import { reportOf } from '@/lib/server/orders/rule-facts';
import { findPreparation } from '@/lib/server/usecases/fetch-file';

export const GET = endpoint('GET /api/orders/:number/preparations/:id/report', async ({ person, params }) => {
  const report = reportOf(await findPreparation(person, params.number, params.id));
  if (!report) throw new AppError('not-found');
  return report;
});
