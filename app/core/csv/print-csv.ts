/** One value of a CSV line. */
export type CsvValue = string | number | null;

/**
 * One line of a CSV file (RFC 4180), with its line end. Text that a spreadsheet would run as a formula is kept as text by a leading apostrophe.
 */
export function csvLine(values: CsvValue[]): string {
  return `${values.map(csvCell).join(",")}\r\n`;
}

function csvCell(value: CsvValue): string {
  if (value === null) return "";
  if (typeof value === "number") return String(value);
  const safe = /^[=+\-@\t\r]/.test(value) ? `'${value}` : value;
  return /[",\r\n]/.test(safe) ? `"${safe.replaceAll('"', '""')}"` : safe;
}
