import type { QuantityName } from "../../../../shared/entry/quantities";
import { EntryField } from "../../../components/EntryField";
import { problemAt, useRecording } from "./context";
import { Section } from "./Section";

type Field = "vesselVolume" | "filtrateVolume" | "liquorDensity" | "washVolume" | "residueDryMass";

/** What came out: liquor, wash, solids. */
export function ProductsSection() {
  const { values, edit, problems, readOnly } = useRecording();
  const leach = values.kind === "leach";
  const lines: readonly { key: Field; label: string; quantity: QuantityName; hint?: string }[] = [
    {
      key: "vesselVolume",
      label: "Liquor in the vessel at the end",
      quantity: "volume",
      hint: "Before filtering. Empty: start less samples plus make-up, so evaporation goes unseen.",
    },
    { key: "filtrateVolume", label: "Filtrate", quantity: "volume" },
    { key: "liquorDensity", label: "Density of the final liquor", quantity: "density" },
    { key: "washVolume", label: "Wash", quantity: "volume", hint: "0 where the solids were not washed." },
    {
      key: "residueDryMass",
      label: leach ? "Dry residue" : "Dry cement",
      quantity: "mass",
      hint: "Washed and dried; unwashed solids carry liquor.",
    },
  ];
  return (
    <Section id="products" title="Products">
      <div className="max-w-[460px]">
        {lines.map(({ key, label, quantity, hint }) => (
          <EntryField
            key={key}
            label={label}
            quantity={quantity}
            hint={readOnly ? undefined : hint}
            value={values.products[key]}
            onChange={(entry) => edit((t) => ({ ...t, products: { ...t.products, [key]: entry } }), `products.${key}`)}
            error={problemAt(problems, `products.${key}`)}
            readOnly={readOnly}
          />
        ))}
      </div>
    </Section>
  );
}
