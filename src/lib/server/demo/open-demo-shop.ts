import { audit } from '../audit';
import { config } from '../config';
import { database, withWrite } from '../db';
import { log } from '../log';
import type { Person } from '../person';
import { allMachines } from '../tables/machines';
import { countOrders } from '../tables/orders';
import { peopleInRole, personById, type PersonRow } from '../tables/people';
import { recordOf } from '../tables/record';
import { allStocks } from '../tables/stocks';
import { enterWalkIn } from '../usecases/enter-walk-in';
import { carryDemoOrder, type DemoShop } from './carry-demo-order';
import { DEMO_ORDERS } from './demo-orders';

const asPerson = ({ id, name, email, role, confirmed_at }: PersonRow): Person => ({ id, name, email, role, confirmed: confirmed_at !== null });

/** Somebody who came to the counter and has no account. */
const WALK_IN = { name: 'Bram Adeyemi', email: 'bram.adeyemi@kettle-lane.example' };

async function demoShop(): Promise<DemoShop | null> {
  const [customer] = await peopleInRole(database(), 'customer');
  const [designer] = await peopleInRole(database(), 'designer');
  const [operator] = await peopleInRole(database(), 'operator');
  if (!customer || !designer || !operator) return null;
  const { id } = await enterWalkIn(asPerson(designer), WALK_IN.name, WALK_IN.email);
  const walkIn = await personById(database(), id);
  if (!walkIn) return null;
  return {
    registered: asPerson(customer),
    walkIn: asPerson(walkIn),
    designer: asPerson(designer),
    operator: asPerson(operator),
    machines: await allMachines(database()),
    stocks: await allStocks(database()),
  };
}

/** Whether this is a demo shop that nobody has ordered anything from yet. */
async function isEmptyDemoShop(): Promise<boolean> {
  if (!config().demoOrders || (await countOrders(database())) > 0) return false;
  return (await recordOf(database(), 'shop')).some(({ event }) => event === 'open-demo-shop');
}

/** Fills an empty demo shop with orders in every state; one that does not come out is written down and left behind. */
export async function openDemoShop(): Promise<void> {
  if (!(await isEmptyDemoShop())) return;
  const shop = await demoShop();
  if (!shop) return;
  for (const demo of DEMO_ORDERS) {
    try {
      await carryDemoOrder(shop, demo);
    } catch (error) {
      log.warn({ err: error, title: demo.title }, 'an order of the demo shop was left half-way');
    }
  }
  await withWrite((trx) => audit(trx, { by: null, event: 'fill-demo-shop', subject: 'shop', words: 'orders in every state' }));
}
