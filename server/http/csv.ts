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
  // Without quote_record_delimiter a lone line feed in a note would go out unquoted and break its row in two.
  return stringify(table, { record_delimiter: "\r\n", quote_record_delimiter: true, escape_formulas: true, bom: true });
}
