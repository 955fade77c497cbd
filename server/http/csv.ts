export type Cell = string | number | boolean | null;

/** Digits with a sign, a decimal mark and an exponent are a number to a spreadsheet, never a formula. */
const number = /^[+-]?\d+([.,]\d+)?(e[+-]?\d+)?$/i;

/** A spreadsheet would run text that begins like a formula; a leading apostrophe keeps it text. */
const harmless = (text: string) => (/^[=+\-@\t\r]/.test(text) && !number.test(text) ? `'${text}` : text);

function field(cell: Cell): string {
  if (cell === null) return "";
  if (typeof cell === "boolean") return cell ? "yes" : "no";
  const text = typeof cell === "number" ? String(cell) : harmless(cell);
  return /[",\n\r]/.test(text) ? `"${text.replaceAll('"', '""')}"` : text;
}

/** One line of a file after RFC 4180: comma, quotes doubled, CRLF. */
export const csvLine = (cells: readonly Cell[]): string => `${cells.map(field).join(",")}\r\n`;

/** The byte-order mark makes spreadsheets read the file as UTF-8. */
export const byteOrderMark = "\ufeff";
