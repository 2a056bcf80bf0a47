import { endpoint } from '../../../lib/server/http/endpoint';
import { addStock } from '../../../lib/server/usecases/keep-stock';
import { listStocks } from '../../../lib/server/usecases/list-stocks';

export const GET = endpoint('GET /api/stocks', async () => ({ stocks: await listStocks() }));

export const POST = endpoint('POST /api/stocks', async ({ person, body }) => ({
  stock: await addStock(person, body),
}));
