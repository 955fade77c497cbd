import { saveFile } from "./saveFile";

type Cell = string | number | null | undefined;

/** A spreadsheet would run text that begins like a formula; a leading apostrophe keeps it text. */
const safe = (text: string) => (/^[=+\-@\t\r]/.test(text) && Number.isNaN(Number(text)) ? `'${text}` : text);

const quoted = (cell: Cell): string => {
  if (cell === null || cell === undefined) return "";
  const text = typeof cell === "number" ? String(cell) : safe(cell);
  return /[",\n\r]/.test(text) ? `"${text.replaceAll('"', '""')}"` : text;
};

/** RFC 4180: comma, CRLF, quotes doubled. */
export const toCsv = (header: string[], rows: Cell[][]): string =>
  [header, ...rows].map((row) => row.map(quoted).join(",")).join("\r\n") + "\r\n";

/** Hands a text to the browser as a file. The byte-order mark makes spreadsheets read it as UTF-8. */
export function downloadText(name: string, text: string, type = "text/csv"): void {
  saveFile(name, new Blob(["\ufeff", text], { type: `${type};charset=utf-8` }));
}
