/** What mysql2 hands over for each value. */
interface Column {
  type: string;
  length: number;
  string(): string | null;
}

/**
 * How a column of MariaDB becomes a value: DECIMAL a number, BIGINT (COUNT too) a number where exact and else a bigint,
 * TINYINT(1) a boolean, DATE "YYYY-MM-DD". The rest as the driver does it; JSON arrives parsed from a server that says which columns are JSON, else as text.
 */
export function castColumn(column: Column, asDriver: () => unknown): unknown {
  switch (column.type) {
    case "DECIMAL":
    case "NEWDECIMAL":
      return mapText(column.string(), Number);
    case "LONGLONG":
      return mapText(column.string(), exactInteger);
    case "DATE":
      return column.string();
    case "TINY":
      return column.length === 1 ? mapText(column.string(), (text) => text !== "0") : asDriver();
    default:
      return asDriver();
  }
}

function exactInteger(text: string): number | bigint {
  const number = Number(text);
  return Number.isSafeInteger(number) ? number : BigInt(text);
}

function mapText<T>(text: string | null, convert: (text: string) => T): T | null {
  return text === null ? null : convert(text);
}
