import { useMemo } from "react";
import type { Analysis } from "../../../../shared/analysis";
import type { SetPoint } from "../../../../shared/solution";
import type { ChemicalData } from "../../../../shared/species/chemicalData";
import { limitMoves } from "../../../../shared/windows/limitMoves";
import type { LimitSentence } from "../../../../shared/windows/limitWords";
import { ligandWord } from "../../../../shared/words/componentWord";
import { later } from "../../../components/later";
import { moveWords } from "../model/moveWords";

interface LimitMovesProps {
  sentence: LimitSentence;
  setPoint: SetPoint;
  analysis: Analysis;
  data: ChemicalData;
  metalName: (element: string) => string;
}

/** What would move a limit, one thing at a time. */
export const LimitMoves = later(function LimitMoves(props: LimitMovesProps) {
  const { sentence, setPoint, analysis, data, metalName } = props;
  const words = useMemo(
    () =>
      moveWords(sentence, limitMoves(analysis, sentence.limit, setPoint), {
        metalName,
        componentName: (component) => ligandWord(data, component, analysis.prepared.sulfateReduction),
      }),
    [sentence, setPoint, analysis, data, metalName],
  );
  return words === null ? null : (
    <p className="text-sm" data-testid="limit-moves">
      {words}
    </p>
  );
});
