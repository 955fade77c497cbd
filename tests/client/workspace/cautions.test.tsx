import { fireEvent, render, screen } from "@testing-library/react";
import { useState } from "react";
import { MemoryRouter } from "react-router-dom";
import { expect, test } from "vitest";
import { cautionsFor, hazardContext } from "../../../shared/hazards/rules";
import { later } from "../../../src/components/later";
import { CautionsBlock } from "../../../src/features/workspace/answers/CautionsBlock";
import { sheetInputs } from "../../support/sheetFixture";

const Cautions = later(CautionsBlock);
const inputs = { ...sheetInputs, preset: "cyanide" as const, ligands: [{ component: "CN", activity: 0.01 }] };
const cautions = cautionsFor(hazardContext(inputs, { pH: 9.5, Eh: 0 }));

/** As the plan's screen has it: what is named goes to the draft, and comes back to the block when the hand rests. */
function Screen({ onNamed }: { onNamed: (procedure: string) => void }) {
  const [procedures, setProcedures] = useState<Record<string, string>>({});
  return (
    <MemoryRouter>
      <Cautions
        cautions={cautions}
        preset="cyanide"
        procedures={procedures}
        onProcedure={(code, procedure) => {
          setProcedures((old) => ({ ...old, [code]: procedure }));
          onNamed(procedure);
        }}
      />
    </MemoryRouter>
  );
}

test("a procedure's name stands as it is typed, letter by letter, though the cautions follow late", () => {
  const named: string[] = [];
  render(<Screen onNamed={(procedure) => named.push(procedure)} />);
  fireEvent.click(screen.getAllByRole("checkbox")[0]!);
  const field = screen.getByLabelText<HTMLInputElement>("Name or number of the procedure");
  screen.getByText("Not confirmed until the procedure is named.");
  for (const letter of "CN-7") fireEvent.change(field, { target: { value: field.value + letter } });
  expect(field.value).toBe("CN-7");
  expect(named).toEqual(["C", "CN", "CN-", "CN-7"]);
  expect(screen.queryByText("Not confirmed until the procedure is named.")).toBeNull();
});
