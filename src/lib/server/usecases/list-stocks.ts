import type { StockView } from '../../orders/views';
import { database } from '../db';
import { allStocks } from '../tables/stocks';

/** Stocks with their cautions; forbidden ones too, so that a customer learns that they are. */
export const listStocks = (): Promise<StockView[]> => allStocks(database());
