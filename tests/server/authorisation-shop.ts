import { open, openShop, orderAt, startShopQueue, stopShopQueue, type Shop } from './orders/shop';

/** A shop where one customer has an order with every part there is, and another has a bare draft. */
export async function openAuthorisationShop(): Promise<{ shop: Shop; real: Record<string, string> }> {
  const shop = await openShop();
  startShopQueue();
  const order = await orderAt(shop, 'proof-sent');
  const [preparation] = order.preparations;
  const own = await open(shop.stranger, { title: 'A draft of the stranger' });
  return {
    shop,
    real: {
      number: order.number,
      artworkVersion: '1',
      id: String(preparation.id),
      name: 'burned',
      ownNumber: own.number,
    },
  };
}

export const closeShop = stopShopQueue;
