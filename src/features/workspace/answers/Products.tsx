import { useMemo } from "react";
import { partsOf, productsFor } from "../../../../shared/reactions/products";
import { redoxReagentById } from "../../../../shared/reactions/redoxReagents";
import { SULFIDE_SULFUR } from "../../../../shared/selection/components";
import type { ChemicalData } from "../../../../shared/species/chemicalData";
import { SpeciesName } from "../../../components/Formula";
import { Select, type SelectOption } from "../../../components/Select";
import { isMetalOf } from "../model/overallParts";

interface ProductsProps {
  from: string;
  data: ChemicalData;
  sulfateReduction: boolean;
  redox: string | null;
  /** what each part becomes without any choice of hand */
  rules: ReadonlyMap<string, string>;
  chosen: Readonly<Record<string, string>>;
  /** absent where the plan is only looked at */
  onChoose: ((component: string, product: string | null) => void) | undefined;
}

const RULES = "as it stands";

/** What each part of the start becomes: the species that rules at the set point, or another where that one is not what forms in practice. */
export function Products({ from, data, sulfateReduction, redox, rules, chosen, onChoose }: ProductsProps) {
  const cementing = redoxReagentById.get(redox ?? "");
  const parts = useMemo(() => {
    const own = partsOf(data.species.get(from), sulfateReduction);
    const dust = cementing?.role === "cementing metal" ? cementing.sold?.formula : undefined;
    return [...own, ...(dust === undefined || own.includes(dust) ? [] : [dust])].filter(
      (c) => c === SULFIDE_SULFUR || c === "S" || isMetalOf(data, c),
    );
  }, [data, from, sulfateReduction, cementing]);
  return parts.map((component) => (
    <Product
      key={component}
      {...{ from, data, sulfateReduction, component }}
      rules={rules.get(component)}
      value={chosen[component]}
      onChoose={onChoose}
    />
  ));
}

function Product({
  from,
  data,
  sulfateReduction,
  component,
  rules,
  value,
  onChoose,
}: Pick<ProductsProps, "from" | "data" | "sulfateReduction" | "onChoose"> & {
  component: string;
  rules: string | undefined;
  value: string | undefined;
}) {
  const element = component === SULFIDE_SULFUR ? "S" : component;
  const options = useMemo((): SelectOption<string>[] => {
    const ids = productsFor(data, from, component, sulfateReduction).filter((id) => id !== rules);
    return [
      {
        value: RULES,
        label: rules === undefined ? "what rules here" : <SpeciesName id={rules} withPhase />,
        text: rules ?? RULES,
        note: "rules at the set point",
      },
      ...ids.map((id) => ({ value: id, label: <SpeciesName id={id} withPhase />, text: id })),
    ];
  }, [data, from, component, sulfateReduction, rules]);
  return (
    <Select
      label={`What ${element} of ${from} becomes`}
      labelText={
        <>
          {element} becomes{value !== undefined && <span className="text-sm text-muted">, chosen</span>}
        </>
      }
      readOnly={onChoose === undefined}
      value={value ?? RULES}
      onChange={(next) => onChoose?.(component, next === RULES ? null : next)}
      options={options}
    />
  );
}
