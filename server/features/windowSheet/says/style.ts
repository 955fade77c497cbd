import { fixed, withUnit } from "../../../../shared/words/numbers";
import { piecesOf, type Inline, type Piece } from "../pen";

export const bold = (text: string): Inline => ({ text, face: "bold" });
export const emboldened = (inline: Inline): Inline =>
  piecesOf(inline).map((piece): Piece => ({ ...piece, face: "bold" }));
export const inSans = (inline: Inline): Inline => piecesOf(inline).map((piece): Piece => ({ ...piece, face: "sans" }));
export const volts = (E: number, digits = 2): string => withUnit(fixed(E, digits), "V");
export const millivolts = (E: number): string => withUnit(fixed(E * 1000, 0), "mV");
