import { readFileSync } from 'node:fs';
import path from 'node:path';

/** Cells of one line of comma-separated values; quoted cells may hold commas. */
function cellsOf(line: string): string[] {
  return [...line.matchAll(/(?:^|,)(?:"((?:[^"]|"")*)"|([^,]*))/g)].map(([, quoted, plain]) =>
    quoted === undefined ? plain : quoted.replaceAll('""', '"'),
  );
}

/** Rows of a table in tests/reference/data, each by its column names. */
export function readTable(name: string): Record<string, string>[] {
  const text = readFileSync(path.join(import.meta.dirname, 'data', name), 'utf8');
  const [head, ...lines] = text.split(/\r?\n/).filter((line) => line.trim() !== '');
  const columns = cellsOf(head);
  return lines.map((line) => {
    const cells = cellsOf(line);
    if (cells.length !== columns.length) throw new Error(`${name}: a row has ${cells.length} cells: ${line}`);
    return Object.fromEntries(columns.map((column, index) => [column, cells[index]]));
  });
}
