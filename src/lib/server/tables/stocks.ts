import type { StockView } from '../../orders/views';
import { cautionIdSchema, routeSchema, type Stock } from '../../stock/stock';
import type { Db } from '../db';
import { decode } from './json-column';

interface StockRow {
  id: number;
  name: string;
  species: string;
  thickness_mm: number;
  finish: string;
  direction: Stock['direction'];
  ground_colour: string;
  ground_lstar: number;
  mark_colour: string;
  mark_lstar: number;
  cautions: string;
  forbidden: 0 | 1;
  routes: string;
  notes: string;
  retired_at: string | null;
}

function columns(stock: Stock): Omit<StockRow, 'id' | 'retired_at'> {
  return {
    name: stock.name,
    species: stock.species,
    thickness_mm: stock.thicknessMm,
    finish: stock.finish,
    direction: stock.direction,
    ground_colour: stock.groundColour,
    ground_lstar: stock.groundLstar,
    mark_colour: stock.markColour,
    mark_lstar: stock.markLstar,
    cautions: JSON.stringify(stock.cautions),
    forbidden: stock.forbidden ? 1 : 0,
    routes: JSON.stringify(stock.routes),
    notes: stock.notes,
  };
}

const view = (row: StockRow): StockView => ({
  id: row.id,
  name: row.name,
  species: row.species,
  thicknessMm: row.thickness_mm,
  finish: row.finish,
  direction: row.direction,
  groundColour: row.ground_colour,
  groundLstar: row.ground_lstar,
  markColour: row.mark_colour,
  markLstar: row.mark_lstar,
  cautions: decode(cautionIdSchema.array(), row.cautions),
  forbidden: row.forbidden === 1,
  routes: decode(routeSchema.array(), row.routes),
  notes: row.notes,
  retired: row.retired_at !== null,
});

/** Those in use first, then by name. */
export async function allStocks(db: Db): Promise<StockView[]> {
  return (await db<StockRow>('stocks').orderByRaw('retired_at is not null, name collate nocase')).map(view);
}

export async function stockById(db: Db, id: number): Promise<StockView | null> {
  const row = await db<StockRow>('stocks').where({ id }).first();
  return row ? view(row) : null;
}

export async function insertStock(db: Db, stock: Stock): Promise<number> {
  const [id] = await db('stocks').insert(columns(stock));
  return id;
}

export async function updateStock(db: Db, id: number, stock: Stock, retiredAt: string | null): Promise<void> {
  await db('stocks')
    .where({ id })
    .update({ ...columns(stock), retired_at: retiredAt });
}
