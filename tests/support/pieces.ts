import { analyse } from "../../shared/analysis";
import { cornersOf } from "../../shared/geometry/convex";
import { valueOf } from "../../shared/outcome";
import type { Problem } from "../../shared/schemas/problem";
import type { ChemicalData } from "../../shared/species/chemicalData";
import type { WindowPiece } from "../../shared/windows/pieces";

/** The convex pieces behind a solution's windows, which the solution itself does not show. */
export const piecesOf = (problem: Problem, library: ChemicalData): readonly WindowPiece[] =>
  valueOf(analyse(problem, library)).pieces;

export const polygonOf = ({ piece }: WindowPiece): [number, number][] => cornersOf(piece);
