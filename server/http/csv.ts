import { stringify } from "csv-stringify/sync";

export interface CsvColumn<Row> {
  header: string;
  value: (row: Row) => string | number | null;
}

/**
 * A table as RFC 4180 has it: CRLF, quoted where needed, one header line. Two things for the spreadsheet it will be
 * opened in: text that would run as a formula gets a leading apostrophe, and a byte order mark says that it is UTF-8.
 */
export function writeCsv<Row>(columns: readonly CsvColumn<Row>[], rows: readonly Row[]): string {
  const table = [columns.map(({ header }) => header), ...rows.map((row) => columns.map(({ value }) => value(row)))];
  return stringify(table, { record_delimiter: "\r\n", escape_formulas: true, bom: true });
}
