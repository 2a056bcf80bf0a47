import { audit } from '../audit';
import { config } from '../config';
import { database, withWrite } from '../db';
import { log } from '../log';
import type { Person } from '../person';
import { allMachines } from '../tables/machines';
import { orderTitles } from '../tables/orders';
import { peopleInRole, personById, type PersonRow } from '../tables/people';
import { recordOf } from '../tables/record';
import { allStocks } from '../tables/stocks';
import { enterWalkIn } from '../usecases/enter-walk-in';
import { carryDemoOrder, type DemoShop } from './carry-demo-order';
import { DEMO_ORDERS } from './demo-orders';

const asPerson = ({ id, name, email, role, confirmed_at }: PersonRow): Person => ({
  id,
  name,
  email,
  role,
  confirmed: confirmed_at !== null,
});

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

/** Whether this is a demo shop that has not been filled to the end yet. */
async function isUnfilledDemoShop(): Promise<boolean> {
  if (!config().demoOrders) return false;
  const events = (await recordOf(database(), 'shop')).map(({ event }) => event);
  return events.includes('open-demo-shop') && !events.includes('fill-demo-shop');
}

/**
 * Fills the demo shop with orders in every state. Stopped half-way, the next start goes on with those that are missing; one
 * that does not come out is written down and left behind.
 */
export async function openDemoShop(): Promise<void> {
  if (!(await isUnfilledDemoShop())) return;
  const shop = await demoShop();
  if (!shop) return;
  const known = await orderTitles(database());
  for (const demo of DEMO_ORDERS.filter(({ title }) => !known.includes(title))) {
    try {
      await carryDemoOrder(shop, demo);
    } catch (error) {
      log.warn({ err: error, title: demo.title }, 'an order of the demo shop was left half-way');
    }
  }
  await withWrite((trx) =>
    audit(trx, { by: null, event: 'fill-demo-shop', subject: 'shop', words: 'orders in every state' }),
  );
}
